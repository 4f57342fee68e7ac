import { z } from 'zod'
import { roles } from '@/lib/auth/access'
import { idSchema, timeSchema } from './common'
import { operation } from './operation'

export const apiTokenStates = ['live', 'ended', 'revoked'] as const

export const apiTokenSchema = z
  .object({
    id: idSchema,
    name: z.string(),
    workshop: z.object({ id: idSchema, name: z.string() }),
    /** What it was made as. */
    role: z.enum(roles),
    /** What it can do now: never more than whoever made it; null where it opens nothing. */
    actsAs: z.enum(roles).nullable(),
    state: z.enum(apiTokenStates),
    endsAt: timeSchema,
    lastUsedAt: timeSchema.nullable(),
    createdAt: timeSchema,
  })
  .meta({ id: 'ApiToken' })
export type ApiToken = z.output<typeof apiTokenSchema>

export const createApiToken = operation({
  id: 'createApiToken',
  method: 'POST',
  path: '/api/v1/workshops/{id}/tokens',
  summary: 'Make a token that lets a program act for you in one workshop; it is told this once',
  for: 'person',
  atPage: true,
  limit: 'writing',
  params: z.object({ id: idSchema }),
  body: z.object({
    /** What it is for, in your own words. */
    name: z.string().trim().min(1).max(80),
    /** No greater than your own, which it is where none is named. */
    role: z.enum(roles).optional(),
    days: z.int().min(1).max(366).default(90),
  }),
  status: 201,
  answer: z.object({ token: apiTokenSchema, secret: z.string() }),
  problems: { 409: 'There are as many as there may be' },
})

export const listApiTokens = operation({
  id: 'listApiTokens',
  method: 'GET',
  path: '/api/v1/account/tokens',
  summary: 'Your own tokens in every workshop, newest first, at most 100',
  for: 'person',
  atPage: true,
  limit: 'reading',
  status: 200,
  answer: z.object({ tokens: z.array(apiTokenSchema) }),
})

export const revokeApiToken = operation({
  id: 'revokeApiToken',
  method: 'DELETE',
  path: '/api/v1/account/tokens/{id}',
  summary: 'Revoke a token of your own for good',
  for: 'person',
  atPage: true,
  limit: 'writing',
  params: z.object({ id: idSchema }),
  status: 204,
})

export const tokenOperations = [createApiToken, listApiTokens, revokeApiToken]
