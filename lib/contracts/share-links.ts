import { z } from 'zod'
import { idSchema, themeSchema, timeSchema } from './common'
import { sceneDocument } from './documents'
import { operation } from './operation'

export const linkStates = ['live', 'ended', 'withdrawn'] as const

export const shareLinkSchema = z
  .object({
    id: idSchema,
    sceneId: idSchema,
    label: z.string(),
    /** Null follows the scene's latest version. */
    version: z.int().min(1).nullable(),
    state: z.enum(linkStates),
    endsAt: timeSchema.nullable(),
    revokedAt: timeSchema.nullable(),
    opened: z.int(),
    lastOpenedAt: timeSchema.nullable(),
    createdBy: z.string(),
    createdAt: timeSchema,
  })
  .meta({ id: 'ShareLink' })
export type ShareLink = z.output<typeof shareLinkSchema>

const byScene = z.object({ id: idSchema })
/** Any text: what could not be a token is answered like one that is not known. */
const tokenSchema = z.string()

export const listShareLinks = operation({
  id: 'listShareLinks',
  method: 'GET',
  path: '/api/v1/scenes/{id}/share-links',
  summary: 'Links to a scene, newest first',
  for: 'person',
  limit: 'reading',
  params: byScene,
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
  params: byScene,
  body: z.object({
    /** Whom or what it is for, in the workshop's own words. */
    label: z.string().trim().max(120).default(''),
    version: z.int().min(1).nullable().default(null),
    endsAt: timeSchema.nullable().default(null),
  }),
  status: 201,
  answer: z.object({ link: shareLinkSchema, url: z.url() }),
})

export const revokeShareLink = operation({
  id: 'revokeShareLink',
  method: 'DELETE',
  path: '/api/v1/share-links/{id}',
  summary: 'Withdraw a link for good',
  for: 'person',
  limit: 'writing',
  params: byScene,
  status: 200,
  answer: z.object({ link: shareLinkSchema }),
})

const byToken = z.object({ token: tokenSchema })
const neutral = { 404: 'Unknown, ended or withdrawn: the same answer for each' } as const

export const sharedSceneSchema = z
  .object({
    title: z.string(),
    workshop: z.string(),
    version: z.int().min(1),
    savedAt: timeSchema,
    endsAt: timeSchema.nullable(),
    document: sceneDocument,
  })
  .meta({ id: 'SharedScene' })
export type SharedScene = z.output<typeof sharedSceneSchema>

export const openShareLink = operation({
  id: 'openShareLink',
  method: 'GET',
  path: '/api/v1/shared/{token}',
  summary: 'What a share link opens',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  status: 200,
  answer: sharedSceneSchema,
  problems: neutral,
})

export const countOpening = operation({
  id: 'countOpening',
  method: 'POST',
  path: '/api/v1/shared/{token}/openings',
  summary: 'Count that somebody has the page of a share link before them',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  status: 204,
  problems: neutral,
})

export const sharedPoster = operation({
  id: 'sharedPoster',
  method: 'GET',
  path: '/api/v1/shared/{token}/poster.png',
  summary: 'A picture of what a share link opens',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  query: z.object({ theme: themeSchema.default('light') }),
  status: 200,
  media: 'image/png',
  problems: neutral,
})

export const shareLinkOperations = [
  listShareLinks,
  createShareLink,
  revokeShareLink,
  openShareLink,
  countOpening,
  sharedPoster,
]
