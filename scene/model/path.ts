/** Where a value stands in a document: keys of objects and indices of lists. */
export type Path = readonly (string | number)[]

export interface Change {
  path: Path
  /** Undefined takes the field out. */
  value: unknown
}

export function getAt(document: unknown, path: Path): unknown {
  let at = document
  for (const key of path) {
    if (at === null || typeof at !== 'object') return undefined
    at = (at as Record<string | number, unknown>)[key]
  }
  return at
}

/** A new document that differs only along the path; everything beside it is shared. Missing objects are made. */
export function setAt<T>(document: T, path: Path, value: unknown): T {
  if (path.length === 0) return value as T
  const [key, ...rest] = path
  const inside = getAt(document, [key])
  const next = setAt(inside, rest, value)
  if (Object.is(next, inside)) return document
  if (Array.isArray(document)) return document.with(Number(key), next) as T
  const copy = { ...(document as Record<string | number, unknown>), [key]: next }
  if (next === undefined) delete copy[key]
  return copy as T
}

export const applyChanges = <T>(document: T, changes: readonly Change[]): T =>
  changes.reduce((at, { path, value }) => setAt(at, path, value), document)
