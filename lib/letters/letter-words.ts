import type { LetterName } from './letter-data'

/** What each letter is called in a list. */
export const letterWords: Record<LetterName, string> = {
  invitation: 'Invitation',
  'password-reset': 'New password',
  'review-asked': 'Review asked for',
  'review-answered': 'Review answered',
  'review-reminder': 'Reminder of a review',
  question: 'Question through a link',
  'question-copy': 'Copy of a question',
  'mention-digest': 'Mentions',
  link: 'Link',
}
