import { z } from 'zod'

const oneLine = z.string().max(300)
const words = z.string().max(4_000)
const url = z.url({ protocol: /^https?$/ })
const version = z.int().min(1)

const review = { scene: oneLine, version, url }

/** What each letter needs to be told; the rest of it is wording. Days and times are ISO. */
export const letterData = {
  invitation: z.object({
    workshop: oneLine,
    role: oneLine,
    inviter: oneLine,
    url,
    endsAt: z.iso.datetime(),
  }),
  'password-reset': z.object({ name: oneLine, url, minutes: z.int().min(1) }),
  'review-asked': z.object({ ...review, asker: oneLine, due: oneLine.nullable(), message: words }),
  'review-answered': z.object({ ...review, person: oneLine, word: oneLine, sentence: words }),
  'review-reminder': z.object({ ...review, asker: oneLine, due: oneLine }),
  question: z.object({
    scene: oneLine,
    visitor: oneLine,
    email: z.email(),
    question: words,
    step: oneLine.nullable(),
    url,
  }),
  'question-copy': z.object({ workshop: oneLine, question: words }),
  'mention-digest': z.object({
    mentions: z
      .array(z.object({ scene: oneLine, number: z.int().min(1), by: oneLine, words, url }))
      .min(1)
      .max(200),
  }),
  link: z.object({ sender: oneLine, workshop: oneLine, scene: oneLine, message: words, url }),
} as const

export type LetterName = keyof typeof letterData
export type LetterData = { [Name in LetterName]: z.output<(typeof letterData)[Name]> }

export const letterNames = Object.keys(letterData) as LetterName[]
export const letterNameSchema = z.enum(letterNames)
