import type { Colleague } from './use-colleagues'

/** What is being typed after an @ at the caret, if anything: where the @ stands and what follows it. */
export function mentionAt(text: string, caret: number): { from: number; typed: string } | null {
  const before = text.slice(0, caret)
  const from = before.lastIndexOf('@')
  if (from < 0 || (from > 0 && /[\p{L}\p{N}]/u.test(before[from - 1]))) return null
  const typed = before.slice(from + 1)
  return /^[\p{L}\p{M}'’ .-]{0,60}$/u.test(typed) && !/ {2}|\n/.test(typed) ? { from, typed } : null
}

const folded = (text: string) => text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase()

/** Whose name, or a part of it, begins like that. */
export function matching(people: readonly Colleague[], typed: string): Colleague[] {
  const wanted = folded(typed)
  return people.filter(({ name }) => {
    const words = folded(name)
    return words.startsWith(wanted) || words.split(' ').some((word) => word.startsWith(wanted))
  })
}

/** Ids of those who are named in the words with an @ before their name. */
export const mentionedIn = (words: string, people: readonly Colleague[]): string[] =>
  people.filter(({ name }) => words.includes(`@${name}`)).map(({ id }) => id)
