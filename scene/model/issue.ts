/** One refusal, about one field of a document. `path` is dotted: "cylinders.1.rodLengthMm"; empty for the whole. */
export interface Issue {
  path: string
  code: string
  /** What was understood, with its unit; what the limit is, and why. */
  message: string
  /** One mend. */
  fix: string
}

/** The same refusal for every field it is about. */
export const refuse = (paths: readonly string[], code: string, message: string, fix: string): Issue[] =>
  paths.map((path) => ({ path, code, message, fix }))

/** Each field once a code: what holds for eight cylinders by one common value is said of that value once. */
export function distinct(issues: readonly Issue[]): Issue[] {
  const seen = new Set<string>()
  return issues.filter(({ path, code }) => {
    const key = `${code} ${path}`
    return !seen.has(key) && seen.add(key)
  })
}
