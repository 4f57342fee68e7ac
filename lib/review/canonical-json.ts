const halfPair = /\p{Surrogate}/u

/**
 * The one text of a JSON value, whatever order its members came in: RFC 8785, JSON Canonicalization Scheme. Members are
 * sorted by UTF-16 code units (section 3.2.3), numbers and texts written as ECMAScript does (3.2.2), without spaces.
 * Refuses what JSON cannot say: numbers that are not finite, half of a surrogate pair, undefined members.
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError(`${value} is no JSON number.`)
    return JSON.stringify(value)
  }
  if (typeof value === 'string') {
    if (halfPair.test(value)) throw new RangeError('A text has half of a surrogate pair.')
    return JSON.stringify(value)
  }
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`
  if (typeof value === 'object') {
    const members = Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([name, member]) => `${canonicalJson(name)}:${canonicalJson(member)}`)
    return `{${members.join(',')}}`
  }
  throw new TypeError(`${typeof value} is no JSON value.`)
}
