import { z } from 'zod'
import { operations, roles } from '@/lib/auth/access'
import { emailSchema, idSchema } from './common'
import { operation } from './operation'

export const passwordSchema = z.string().min(10).max(200)

export const personNameSchema = z.string().trim().min(1).max(80)

export const personSchema = z
  .object({
    id: idSchema,
    name: z.string(),
    email: z.string(),
    /** The workshop before them: what is asked for without naming one is of this. */
    workshop: idSchema.nullable(),
    workshops: z.array(
      z.object({
        id: idSchema,
        name: z.string(),
        role: z.enum(roles),
        /** What that role may do: controls for anything else stay hidden. */
        may: z.array(z.enum(operations)),
      }),
    ),
  })
  .meta({ id: 'Person' })
export type PersonAnswer = z.output<typeof personSchema>

const signedIn = z.object({ person: personSchema })

export const signUp = operation({
  id: 'signUp',
  method: 'POST',
  path: '/api/v1/auth/sign-up',
  summary: 'Make an account with a workshop of its own, and sign in',
  for: 'anyone',
  limit: 'sign-up',
  body: z.object({
    name: personNameSchema,
    email: emailSchema,
    password: passwordSchema,
    workshopName: z.string().trim().min(1).max(120).optional(),
  }),
  status: 201,
  answer: signedIn,
  problems: { 409: 'The address has an account already' },
})

export const signIn = operation({
  id: 'signIn',
  method: 'POST',
  path: '/api/v1/auth/sign-in',
  summary: 'Sign in',
  for: 'anyone',
  limit: 'sign-in',
  body: z.object({ email: emailSchema, password: z.string().min(1).max(200) }),
  status: 200,
  answer: signedIn,
})

export const signOut = operation({
  id: 'signOut',
  method: 'POST',
  path: '/api/v1/auth/sign-out',
  summary: 'End this session',
  for: 'anyone',
  limit: 'writing',
  status: 204,
})

export const getSession = operation({
  id: 'getSession',
  method: 'GET',
  path: '/api/v1/auth/session',
  summary: 'Who is signed in, if anybody',
  for: 'anyone',
  limit: 'reading',
  status: 200,
  answer: z.object({ person: personSchema.nullable() }),
})

export const requestPasswordReset = operation({
  id: 'requestPasswordReset',
  method: 'POST',
  path: '/api/v1/auth/password-resets',
  summary: 'Ask for a mail with a link to set a new password; the answer is the same for any address',
  for: 'anyone',
  limit: 'reset',
  body: z.object({ email: emailSchema }),
  status: 202,
})

export const resetPassword = operation({
  id: 'resetPassword',
  method: 'POST',
  path: '/api/v1/auth/password-resets/redeem',
  summary: 'Set a new password with the token of that mail; ends every session of the account',
  for: 'anyone',
  limit: 'reset',
  body: z.object({ token: z.string().min(1).max(200), password: passwordSchema }),
  status: 204,
  problems: { 404: 'The link is used, ended or unknown' },
})

export const peopleOperations = [signUp, signIn, signOut, getSession, requestPasswordReset, resetPassword]
