import { letterHtml } from './letter-html'
import { letterText } from './letter-text'
import { letters } from './letters'
import { letterData, type LetterName } from './letter-data'
import type { Letter } from './letter'

export interface Written {
  subject: string
  text: string
  html: string
  replyTo?: string
  headers: Record<string, string>
}

interface Envelope {
  name: string
  /** Where this kind of mail is turned off: a page for people, and what a mail program posts to (RFC 8058). */
  unsubscribe: { pageUrl: string; postUrl: string } | null
}

// each entry takes its own data, which the schema of the same name has just parsed
const compose = (name: LetterName, data: unknown, reader: { name: string }): Letter =>
  (letters[name] as (data: unknown, reader: { name: string }) => Letter)(letterData[name].parse(data), reader)

/** A subject is one line, whatever is named in it. */
const oneLine = (text: string) => text.replace(/\s+/g, ' ').trim()

export function writeLetter(
  name: LetterName,
  data: unknown,
  { name: reader, unsubscribe }: Envelope,
): Written {
  const letter = compose(name, data, { name: reader })
  return {
    subject: oneLine(letter.subject),
    text: letterText(letter, unsubscribe?.pageUrl ?? null),
    html: letterHtml(letter, unsubscribe?.pageUrl ?? null),
    replyTo: letter.replyTo,
    headers: unsubscribe
      ? {
          'List-Unsubscribe': `<${unsubscribe.postUrl}>`,
          'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
        }
      : {},
  }
}
