import { z } from 'zod'
import { roles } from '@/lib/auth/access'
import { cursorSchema, emailSchema, idSchema, limitSchema, timeSchema } from './common'
import { operation } from './operation'
import { passwordSchema, personNameSchema, personSchema } from './people'

export const invitationStates = ['open', 'accepted', 'ended', 'withdrawn'] as const

export const invitationSchema = z
  .object({
    id: idSchema,
    email: z.string(),
    role: z.enum(roles),
    invitedBy: z.string(),
    state: z.enum(invitationStates),
    sentAt: timeSchema,
    endsAt: timeSchema,
    acceptedAt: timeSchema.nullable(),
    withdrawnAt: timeSchema.nullable(),
  })
  .meta({ id: 'Invitation' })
export type Invitation = z.output<typeof invitationSchema>

const byId = z.object({ id: idSchema })
const one = z.object({ invitation: invitationSchema })

export const listInvitations = operation({
  id: 'listInvitations',
  method: 'GET',
  path: '/api/v1/workshops/{id}/invitations',
  summary: 'Invitations to a workshop, newest first',
  for: 'person',
  limit: 'reading',
  params: byId,
  query: z.object({ after: cursorSchema.optional(), limit: limitSchema }),
  status: 200,
  answer: z.object({ invitations: z.array(invitationSchema), next: cursorSchema.nullable() }),
})

export const invitePerson = operation({
  id: 'invitePerson',
  method: 'POST',
  path: '/api/v1/workshops/{id}/invitations',
  summary: 'Invite whoever has a mail address: the mail has a link that works once, within 7 days',
  for: 'person',
  limit: 'inviting',
  params: byId,
  body: z.object({ email: emailSchema, role: z.enum(roles) }),
  status: 201,
  answer: one,
  problems: { 409: 'They are in already, or have an open invitation' },
})

export const sendInvitationAgain = operation({
  id: 'sendInvitationAgain',
  method: 'POST',
  path: '/api/v1/invitations/{id}/sendings',
  summary: 'Send an invitation again with a new link; the old one opens nothing any more',
  for: 'person',
  limit: 'inviting',
  params: byId,
  status: 200,
  answer: one,
  problems: { 409: 'It is accepted or withdrawn' },
})

export const withdrawInvitation = operation({
  id: 'withdrawInvitation',
  method: 'DELETE',
  path: '/api/v1/invitations/{id}',
  summary: 'Withdraw an invitation: its link opens nothing any more',
  for: 'person',
  limit: 'writing',
  params: byId,
  status: 204,
  problems: { 409: 'It is accepted or withdrawn' },
})

/** Any text: what could not be a token is answered like one that is not known. */
const byToken = z.object({ token: z.string() })
const neutral = { 404: 'Unknown, used, ended or withdrawn: the same answer for each' } as const

export const invitationLookSchema = z.object({
  workshop: z.string(),
  inviter: z.string(),
  email: z.string(),
  role: z.enum(roles),
  endsAt: timeSchema,
  /** Whether the invited address has an account: then signing in is the way to accept. */
  hasAccount: z.boolean(),
})
export type InvitationLook = z.output<typeof invitationLookSchema>

export const lookAtInvitation = operation({
  id: 'lookAtInvitation',
  method: 'GET',
  path: '/api/v1/invited/{token}',
  summary: 'What an invitation says to whoever holds its link; looking changes nothing',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  status: 200,
  answer: invitationLookSchema,
  problems: neutral,
})

export const acceptInvitation = operation({
  id: 'acceptInvitation',
  method: 'POST',
  path: '/api/v1/invited/{token}',
  summary: 'Accept an invitation, signed in with the invited address or with a new account for it',
  for: 'anyone',
  atPage: true,
  limit: 'sign-up',
  params: byToken,
  body: z.object({
    account: z.object({ name: personNameSchema, password: passwordSchema }).optional(),
  }),
  status: 200,
  answer: z.object({ person: personSchema }),
  problems: {
    ...neutral,
    401: 'Neither signed in nor a new account',
    409: 'The address has an account already',
  },
})

export const invitationOperations = [
  listInvitations,
  invitePerson,
  sendInvitationAgain,
  withdrawInvitation,
  lookAtInvitation,
  acceptInvitation,
]
