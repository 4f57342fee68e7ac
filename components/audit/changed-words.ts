/** What an entry of the log says was before and after, a line a member: `role: designer → reviewer`. */
export function changedWords(before: unknown, after: unknown): string[] {
  const [was, is] = [membersOf(before), membersOf(after)]
  return [...new Set([...Object.keys(was), ...Object.keys(is)])].flatMap((name) => {
    const [old, now] = [was[name], is[name]].map(valueWords)
    if (!(name in was)) return [`${name}: ${now}`]
    if (!(name in is)) return [`${name} was ${old}`]
    return old === now ? [] : [`${name}: ${old} → ${now}`]
  })
}

const membersOf = (value: unknown): Record<string, unknown> =>
  value === null || value === undefined
    ? {}
    : typeof value === 'object' && !Array.isArray(value)
      ? (value as Record<string, unknown>)
      : { value }

function valueWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'none'
  return typeof value === 'string' ? value : JSON.stringify(value)
}
