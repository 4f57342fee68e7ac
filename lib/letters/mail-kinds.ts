import type { LetterName } from './letter-data'

/** The kinds of mail that somebody may turn off, each for themselves. */
export const mailKinds = ['mentions', 'review-asked', 'review-answered', 'reminders', 'questions'] as const
export type MailKind = (typeof mailKinds)[number]

/** A letter without a kind is sent because its reader asked for it or cannot do without. */
const kinds: Partial<Record<LetterName, MailKind>> = {
  'mention-digest': 'mentions',
  'review-asked': 'review-asked',
  'review-answered': 'review-answered',
  'review-reminder': 'reminders',
  question: 'questions',
}

export const kindOf = (letter: LetterName): MailKind | undefined => kinds[letter]

export const kindWords: Record<MailKind, string> = {
  mentions: 'Mentions of you in notes, gathered',
  'review-asked': 'A review asked of you',
  'review-answered': 'An answer to a review you asked for',
  reminders: 'Reminders of reviews that are due',
  questions: 'Questions from visitors of your links',
}
