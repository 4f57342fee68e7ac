import { presets } from '@/scene/model/presets'

export const REMOVED = Symbol('removed')

/** A copy of a preset's document with values put in (or taken out) at dotted paths. */
export function changed(preset: string, changes: Record<string, unknown> = {}): unknown {
  const found = presets.find(({ id }) => id === preset)
  if (!found) throw new Error(`no preset ${preset}`)
  const document: unknown = structuredClone(found.train)
  for (const [path, value] of Object.entries(changes)) {
    const steps = path.split('.')
    const last = steps.pop()!
    const owner = steps.reduce<Record<string, unknown>>(
      (at, step) => at[step] as Record<string, unknown>,
      document as Record<string, unknown>,
    )
    if (value === REMOVED) delete owner[last]
    else owner[last] = value
  }
  return document
}
