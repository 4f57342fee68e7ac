import { z } from 'zod'
import { idSchema, timeSchema } from './common'
import { operation } from './operation'
import { passwordSchema, personNameSchema } from './people'

export const sessionSchema = z
  .object({
    id: idSchema,
    /** From what the browser says of itself. */
    device: z.string(),
    begunAt: timeSchema,
    lastSeenAt: timeSchema,
    endsAt: timeSchema,
    /** The one that asks. */
    present: z.boolean(),
  })
  .meta({ id: 'Session' })
export type SessionAnswer = z.output<typeof sessionSchema>

const own = { for: 'person', atPage: true } as const

export const listSessions = operation({
  ...own,
  id: 'listSessions',
  method: 'GET',
  path: '/api/v1/account/sessions',
  summary: 'Where you are signed in, the one seen last first, at most 100',
  limit: 'reading',
  status: 200,
  answer: z.object({ sessions: z.array(sessionSchema) }),
})

export const endOneSession = operation({
  ...own,
  id: 'endOneSession',
  method: 'DELETE',
  path: '/api/v1/account/sessions/{id}',
  summary: 'Sign out one device',
  limit: 'writing',
  params: z.object({ id: idSchema }),
  status: 204,
})

export const endOtherSessions = operation({
  ...own,
  id: 'endOtherSessions',
  method: 'DELETE',
  path: '/api/v1/account/sessions',
  summary: 'Sign out everywhere but here',
  limit: 'writing',
  status: 200,
  answer: z.object({ ended: z.int() }),
})

export const renamePerson = operation({
  ...own,
  id: 'renamePerson',
  method: 'PATCH',
  path: '/api/v1/account',
  summary: 'Change your name',
  limit: 'writing',
  body: z.object({ name: personNameSchema }),
  status: 204,
})

export const changePassword = operation({
  ...own,
  id: 'changePassword',
  method: 'PUT',
  path: '/api/v1/account/password',
  summary: 'Change your password; signs out everywhere but here',
  limit: 'sign-in',
  body: z.object({ present: z.string().min(1).max(200), password: passwordSchema }),
  status: 200,
  answer: z.object({ ended: z.int() }),
})

export const chooseWorkshop = operation({
  ...own,
  id: 'chooseWorkshop',
  method: 'PUT',
  path: '/api/v1/account/workshop',
  summary: 'Put one of your workshops before you, wherever you are signed in',
  limit: 'writing',
  body: z.object({ workshop: idSchema }),
  status: 204,
  problems: { 404: 'You do not belong to such a workshop' },
})

export const accountOperations = [
  listSessions,
  endOneSession,
  endOtherSessions,
  renamePerson,
  changePassword,
  chooseWorkshop,
]
