import { Refusal } from '@/lib/contracts/call'

/** What the server said against it, and what to do. */
export function refusalWords(error: unknown): string {
  if (!(error instanceof Refusal)) return 'That did not work. Try again in a minute.'
  const { detail, cure, issues } = error.problem
  if (issues && issues.length > 0) return issues.map(({ message, fix }) => `${message} ${fix}`).join(' ')
  return `${detail} ${cure}`
}
