import { z } from 'zod'
import { linkKinds } from '@/lib/auth/access'
import { idSchema, limitSchema, timeSchema } from './common'
import { linkOptions } from './link-options'
import { operation } from './operation'

export const linkStates = ['live', 'ended', 'withdrawn'] as const
export const devices = ['phone', 'tablet', 'desktop'] as const

export const shareLinkSchema = z
  .object({
    id: idSchema,
    sceneId: idSchema,
    label: z.string(),
    kind: z.enum(linkKinds),
    /** Null follows the scene's latest version. */
    version: z.int().min(1).nullable(),
    state: z.enum(linkStates),
    endsAt: timeSchema.nullable(),
    /** It wants a password; which, nobody can tell. */
    locked: z.boolean(),
    frameOrigins: z.array(z.string()),
    revokedAt: timeSchema.nullable(),
    opened: z.int(),
    lastOpenedAt: timeSchema.nullable(),
    questions: z.int(),
    createdBy: z.string(),
    createdAt: timeSchema,
  })
  .meta({ id: 'ShareLink' })
export type ShareLink = z.output<typeof shareLinkSchema>

export const openingSchema = z
  .object({
    id: idSchema,
    openedAt: timeSchema,
    device: z.enum(devices),
    version: z.int(),
    drawingSeconds: z.int(),
    figuresSeconds: z.int(),
    notesSeconds: z.int(),
  })
  .meta({ id: 'LinkOpening' })
export type LinkOpening = z.output<typeof openingSchema>

export const linkQuestionSchema = z
  .object({
    id: idSchema,
    askedAt: timeSchema,
    version: z.int(),
    name: z.string(),
    email: z.string(),
    question: z.string(),
    angleDeg: z.number().nullable(),
    view: z.string().nullable(),
  })
  .meta({ id: 'LinkQuestion' })
export type LinkQuestion = z.output<typeof linkQuestionSchema>

const byId = z.object({ id: idSchema })
const page = z.object({ before: idSchema.optional(), limit: limitSchema })
const oneLink = z.object({ link: shareLinkSchema })
/** The id where the next page goes on. */
const next = idSchema.nullable()
const erased = z.object({ erased: z.int() })

export const listShareLinks = operation({
  id: 'listShareLinks',
  method: 'GET',
  path: '/api/v1/scenes/{id}/share-links',
  summary: 'Links to a scene, newest first',
  for: 'person',
  limit: 'reading',
  params: byId,
  status: 200,
  answer: z.object({ links: z.array(shareLinkSchema) }),
})

export const createShareLink = operation({
  id: 'createShareLink',
  method: 'POST',
  path: '/api/v1/scenes/{id}/share-links',
  summary: 'Make a link that opens the scene for whoever holds it; its address is told this once',
  for: 'person',
  limit: 'writing',
  params: byId,
  body: z.object({
    label: linkOptions.label.default(''),
    kind: linkOptions.kind.default('look'),
    version: linkOptions.version.default(null),
    /** Left out it ends after 30 days. */
    endsAt: linkOptions.endsAt.optional(),
    password: linkOptions.password.default(null),
    frameOrigins: linkOptions.frameOrigins.default([]),
  }),
  status: 201,
  answer: z.object({ link: shareLinkSchema, url: z.url() }),
})

export const changeShareLink = operation({
  id: 'changeShareLink',
  method: 'PATCH',
  path: '/api/v1/share-links/{id}',
  summary: 'Change what a link lets, extend it, lock it; what is left out stays',
  for: 'person',
  limit: 'writing',
  params: byId,
  body: z.object(linkOptions).partial(),
  status: 200,
  answer: oneLink,
  problems: { 409: 'Withdrawn for good' },
})

export const revokeShareLink = operation({
  id: 'revokeShareLink',
  method: 'DELETE',
  path: '/api/v1/share-links/{id}',
  summary: 'Withdraw a link for good',
  for: 'person',
  limit: 'writing',
  params: byId,
  status: 200,
  answer: oneLink,
})

export const listOpenings = operation({
  id: 'listOpenings',
  method: 'GET',
  path: '/api/v1/share-links/{id}/openings',
  summary: 'When and on what a link was opened, what was looked at and how long; newest first',
  for: 'person',
  limit: 'reading',
  params: byId,
  query: page,
  status: 200,
  answer: z.object({ openings: z.array(openingSchema), keptDays: z.int(), next }),
})

export const openingsCsv = operation({
  id: 'openingsCsv',
  method: 'GET',
  path: '/api/v1/share-links/{id}/openings.csv',
  summary: 'Every opening of a link that is kept, as a table',
  for: 'person',
  limit: 'printing',
  params: byId,
  status: 200,
  media: 'text/csv',
})

export const openingsJson = operation({
  id: 'openingsJson',
  method: 'GET',
  path: '/api/v1/share-links/{id}/openings.json',
  summary: 'Every opening of a link that is kept',
  for: 'person',
  limit: 'printing',
  params: byId,
  status: 200,
  answer: z.object({ link: shareLinkSchema, openings: z.array(openingSchema) }),
})

export const eraseOpenings = operation({
  id: 'eraseOpenings',
  method: 'DELETE',
  path: '/api/v1/share-links/{id}/openings',
  summary: 'Erase when and how a link was opened, its count too',
  for: 'person',
  limit: 'writing',
  params: byId,
  status: 200,
  answer: erased,
})

export const listLinkQuestions = operation({
  id: 'listLinkQuestions',
  method: 'GET',
  path: '/api/v1/share-links/{id}/questions',
  summary: 'What was asked on a link’s page, newest first',
  for: 'person',
  limit: 'reading',
  params: byId,
  query: page,
  status: 200,
  answer: z.object({ questions: z.array(linkQuestionSchema), next }),
})

export const eraseLinkQuestions = operation({
  id: 'eraseLinkQuestions',
  method: 'DELETE',
  path: '/api/v1/share-links/{id}/questions',
  summary: 'Erase what was asked on a link’s page, with names and addresses',
  for: 'person',
  limit: 'writing',
  params: byId,
  status: 200,
  answer: erased,
})

export const shareLinkOperations = [
  listShareLinks,
  createShareLink,
  changeShareLink,
  revokeShareLink,
  listOpenings,
  openingsCsv,
  openingsJson,
  eraseOpenings,
  listLinkQuestions,
  eraseLinkQuestions,
]
