import type { System } from '@/lib/units/quantities'
import type { CrankTrain } from '@/scene/model/crank-train'
import { doubtsOf, type Doubt } from '@/scene/model/doubts'

const found: Record<System, WeakMap<CrankTrain, Doubt[]>> = { si: new WeakMap(), us: new WeakMap() }

/** The doubts about a document that runs, looked for once. */
export function standingDoubts(document: CrankTrain, system: System): Doubt[] {
  const known = found[system].get(document)
  if (known) return known
  const doubts = doubtsOf(document, system)
  found[system].set(document, doubts)
  return doubts
}

/** Slips rather than choices: asked about before the value goes in. The others stand in the list. */
const asked = new Set(['F04', 'F05', 'G07', 'A03', 'M07'])

/** The first doubt of that kind which an edit would bring with it. */
export function doubtBrought(before: CrankTrain, after: CrankTrain, system: System): Doubt | undefined {
  const old = standingDoubts(before, system)
  return standingDoubts(after, system).find(
    (doubt) =>
      asked.has(doubt.code) &&
      !old.some(
        ({ code, path, value }) => code === doubt.code && path === doubt.path && value === doubt.value,
      ),
  )
}
