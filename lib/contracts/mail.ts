import { z } from 'zod'
import { letterNameSchema } from '@/lib/letters/letter-data'
import { mailKinds } from '@/lib/letters/mail-kinds'
import { cursorSchema, idSchema, limitSchema, timeSchema } from './common'
import { operation } from './operation'

const kindSchema = z.enum(mailKinds)

const preferencesSchema = z
  .object({ preferences: z.array(z.object({ kind: kindSchema, wanted: z.boolean() })) })
  .meta({ id: 'MailPreferences' })
export type MailPreferences = z.output<typeof preferencesSchema>

export const readMailPreferences = operation({
  id: 'readMailPreferences',
  method: 'GET',
  path: '/api/v1/mail-preferences',
  summary: 'Which kinds of mail the person gets',
  for: 'person',
  atPage: true,
  limit: 'reading',
  status: 200,
  answer: preferencesSchema,
})

export const keepMailPreference = operation({
  id: 'keepMailPreference',
  method: 'PUT',
  path: '/api/v1/mail-preferences',
  summary: 'Turn a kind of mail on or off for oneself',
  for: 'person',
  atPage: true,
  limit: 'writing',
  body: z.object({ kind: kindSchema, wanted: z.boolean() }),
  status: 200,
  answer: preferencesSchema,
})

export const unsubscribe = operation({
  id: 'unsubscribe',
  method: 'POST',
  path: '/api/v1/unsubscribe/{token}',
  summary:
    'Turn off the kind of mail that carried this token (RFC 8058: the form List-Unsubscribe=One-Click, without cookies)',
  for: 'anyone',
  limit: 'shared',
  params: z.object({ token: z.string() }),
  status: 200,
  answer: z.object({ kind: kindSchema, wanted: z.literal(false) }),
  problems: { 404: 'A token that is not known' },
})

export const askToUnsubscribe = operation({
  id: 'askToUnsubscribe',
  method: 'GET',
  path: '/api/v1/unsubscribe/{token}',
  summary: 'For whoever follows the address instead of posting to it: leads to the page that asks first',
  for: 'anyone',
  limit: 'shared',
  params: z.object({ token: z.string() }),
  status: 303,
})

export const mailStates = ['waiting', 'sending', 'sent', 'failed', 'unsure', 'held'] as const

export const outboxMailSchema = z
  .object({
    id: idSchema,
    letter: letterNameSchema,
    to: z.string(),
    state: z.enum(mailStates),
    attempts: z.int(),
    /** What stood in the way the last time. */
    lastError: z.string().nullable(),
    createdAt: timeSchema,
    sentAt: timeSchema.nullable(),
    /** Whether what it says is still there to be sent again. */
    again: z.boolean(),
  })
  .meta({ id: 'OutboxMail' })
export type OutboxMail = z.output<typeof outboxMailSchema>

export const listMails = operation({
  id: 'listMails',
  method: 'GET',
  path: '/api/v1/mails',
  summary: 'The outbox of a workshop, newest first, a page at a time',
  for: 'person',
  limit: 'reading',
  query: z.object({
    /** Default: the person’s present one. */
    workshop: idSchema.optional(),
    /** `open` leaves out what is sent or was not wanted. */
    show: z.enum(['open', 'all']).default('open'),
    after: cursorSchema.optional(),
    limit: limitSchema,
  }),
  status: 200,
  answer: z.object({ mails: z.array(outboxMailSchema), next: z.string().nullable() }),
})

export const resendMail = operation({
  id: 'resendMail',
  method: 'POST',
  path: '/api/v1/mails/{id}/resend',
  summary: 'Send again a mail that failed, or of which it is not known whether it went',
  for: 'person',
  limit: 'writing',
  params: z.object({ id: idSchema }),
  status: 200,
  answer: z.object({ mail: outboxMailSchema }),
  problems: { 409: 'It is waiting, sent, or its content is gone' },
})

export const mailOperations = [
  readMailPreferences,
  keepMailPreference,
  unsubscribe,
  askToUnsubscribe,
  listMails,
  resendMail,
]
