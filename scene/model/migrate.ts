import { refuse, type Issue } from './issue'

/** Turns a document of one format number into the next: { 1: (document) => document of format 2 }. */
export type Migrations = Readonly<
  Record<number, (document: Record<string, unknown>) => Record<string, unknown>>
>

export type Migrated = { ok: true; json: unknown } | { ok: false; issues: Issue[] }

/**
 * Brings a document of any older format of `kind` ("scene/1", "scene/2", …) to the format `current`, one number at a
 * time. A document of a newer format is refused; anything that states no format of this kind is passed on as it is,
 * for the schema to say what is wrong with it.
 */
export function migrate(json: unknown, kind: string, current: number, migrations: Migrations): Migrated {
  const format = formatNumber(json, kind)
  if (format === null) return { ok: true, json }
  if (format > current)
    return {
      ok: false,
      issues: refuse(
        ['format'],
        'newer-format',
        `This file is in the format ${kind}/${format}; formats up to ${kind}/${current} can be read here.`,
        'Open it with a newer version, or save it from there in the older format.',
      ),
    }
  let document = json as Record<string, unknown>
  for (let number = format; number < current; number++) {
    const step = migrations[number]
    if (step === undefined) return { ok: true, json: document }
    document = { ...step(document), format: `${kind}/${number + 1}` }
  }
  return { ok: true, json: document }
}

function formatNumber(json: unknown, kind: string): number | null {
  const format = typeof json === 'object' && json !== null ? (json as { format?: unknown }).format : undefined
  if (typeof format !== 'string' || !format.startsWith(`${kind}/`)) return null
  const number = format.slice(kind.length + 1)
  return /^[1-9]\d{0,5}$/.test(number) ? Number(number) : null
}
