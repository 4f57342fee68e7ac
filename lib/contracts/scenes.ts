import { z } from 'zod'
import { operations } from '@/lib/auth/access'
import { versionStates } from '@/lib/review/version-states'
import { cursorSchema, idSchema, limitSchema, themeSchema, timeSchema } from './common'
import { arrivingDocument, sceneDocument } from './documents'
import { operation } from './operation'

export const titleSchema = z.string().trim().min(1).max(200)
export const messageSchema = z.string().trim().max(500)
const versionNumber = z.int().min(1)
const byScene = z.object({ id: idSchema })

export const sceneSummarySchema = z
  .object({
    id: idSchema,
    workshopId: idSchema,
    title: z.string(),
    archived: z.boolean(),
    headVersion: versionNumber,
    cylinderCount: z.int(),
    displacementCc: z.number(),
    /** How the head is laid out and fires, in words. */
    layout: z.string(),
    firing: z.string(),
    /** Who saved the head, when, and what they said of it. */
    savedBy: z.string(),
    savedAt: timeSchema,
    message: z.string(),
    /** Of the head, to those who judge it. */
    state: z.enum(versionStates),
    createdAt: timeSchema,
    updatedAt: timeSchema,
    duplicatedFrom: z.object({ sceneId: idSchema, version: versionNumber }).nullable(),
    thumbnailUrl: z.string(),
  })
  .meta({ id: 'SceneSummary' })
export type SceneSummary = z.output<typeof sceneSummarySchema>

const versionFields = {
  number: versionNumber,
  parent: versionNumber.nullable(),
  message: z.string(),
  state: z.enum(versionStates),
  author: z.string(),
  createdAt: timeSchema,
}
export const versionSummarySchema = z.object(versionFields).meta({ id: 'VersionSummary' })
export type VersionSummary = z.output<typeof versionSummarySchema>

export const versionSchema = z.object({ ...versionFields, document: sceneDocument }).meta({ id: 'Version' })
export type VersionAnswer = z.output<typeof versionSchema>

export const openedSceneSchema = z.object({
  scene: sceneSummarySchema,
  version: versionSchema,
  /** What the person who asks may do with it. */
  may: z.array(z.enum(operations)),
})
export type OpenedScene = z.output<typeof openedSceneSchema>

/** The members of a 409 beside those of every problem: nothing is lost, whichever is chosen. */
export const saveConflictSchema = z.object({
  /** What is the head now. */
  head: versionSchema,
  /** What the refused save was based on. */
  base: versionSchema,
  /** The refused save itself, kept as the person's draft of the scene. */
  yours: z.object({ base: versionNumber, message: z.string(), document: sceneDocument }),
})
export type SaveConflict = z.output<typeof saveConflictSchema>

export const sceneStates = ['current', 'archived', 'all'] as const
export const sceneLayouts = ['single', 'in-line', 'two-banks', 'more-banks'] as const
export const sceneSorts = ['updated', 'created', 'title'] as const

export const listScenes = operation({
  id: 'listScenes',
  method: 'GET',
  path: '/api/v1/scenes',
  summary: 'Scenes of a workshop, a page at a time',
  for: 'person',
  limit: 'reading',
  query: z.object({
    /** Default: the one the person has belonged to longest. */
    workshop: idSchema.optional(),
    search: z.string().trim().max(200).optional(),
    state: z.enum(sceneStates).default('current'),
    /** By how many banks of the head carry cylinders. */
    layout: z.enum(sceneLayouts).optional(),
    sort: z.enum(sceneSorts).default('updated'),
    order: z.enum(['up', 'down']).optional(),
    after: cursorSchema.optional(),
    limit: limitSchema,
  }),
  status: 200,
  answer: z.object({ scenes: z.array(sceneSummarySchema), next: cursorSchema.nullable() }),
})

export const createScene = operation({
  id: 'createScene',
  method: 'POST',
  path: '/api/v1/scenes',
  summary: 'Save a scene for the first time: version 1',
  for: 'person',
  limit: 'writing',
  body: z.object({
    workshop: idSchema.optional(),
    /** Default: the title of the crank train. */
    title: titleSchema.optional(),
    message: messageSchema.default(''),
    document: arrivingDocument('SceneInput'),
  }),
  idempotent: true,
  status: 201,
  answer: openedSceneSchema,
})

export const openScene = operation({
  id: 'openScene',
  method: 'GET',
  path: '/api/v1/scenes/{id}',
  summary: 'A scene with one version of it, the head unless asked otherwise',
  for: 'person',
  limit: 'reading',
  params: byScene,
  query: z.object({ version: z.coerce.number().int().min(1).optional() }),
  status: 200,
  answer: openedSceneSchema,
})

export const renameScene = operation({
  id: 'renameScene',
  method: 'PATCH',
  path: '/api/v1/scenes/{id}',
  summary: 'Give a scene another title',
  for: 'person',
  limit: 'writing',
  params: byScene,
  body: z.object({ title: titleSchema }),
  status: 200,
  answer: z.object({ scene: sceneSummarySchema }),
})

export const listVersions = operation({
  id: 'listVersions',
  method: 'GET',
  path: '/api/v1/scenes/{id}/versions',
  summary: 'Versions of a scene, newest first, a page at a time',
  for: 'person',
  limit: 'reading',
  params: byScene,
  query: z.object({ before: z.coerce.number().int().min(1).optional(), limit: limitSchema }),
  status: 200,
  answer: z.object({ versions: z.array(versionSummarySchema), next: versionNumber.nullable() }),
})

export const saveVersion = operation({
  id: 'saveVersion',
  method: 'POST',
  path: '/api/v1/scenes/{id}/versions',
  summary: 'Save a new version on top of the head',
  for: 'person',
  limit: 'writing',
  params: byScene,
  body: z.object({
    /** The version this one was made from. */
    base: versionNumber,
    message: messageSchema.default(''),
    document: arrivingDocument('SceneInput'),
  }),
  idempotent: true,
  status: 201,
  answer: openedSceneSchema,
  problems: { 409: 'The base is not the head: the answer carries `head`, `base` and `yours`' },
})

export const openVersion = operation({
  id: 'openVersion',
  method: 'GET',
  path: '/api/v1/scenes/{id}/versions/{number}',
  summary: 'One version of a scene',
  for: 'person',
  limit: 'reading',
  params: z.object({ id: idSchema, number: z.coerce.number().int().min(1) }),
  status: 200,
  answer: openedSceneSchema,
})

export const duplicateScene = operation({
  id: 'duplicateScene',
  method: 'POST',
  path: '/api/v1/scenes/{id}/duplicate',
  summary: 'A new scene that begins with one version of this one',
  for: 'person',
  limit: 'writing',
  params: byScene,
  body: z.object({ title: titleSchema.optional(), version: versionNumber.optional() }),
  idempotent: true,
  status: 201,
  answer: openedSceneSchema,
})

export const archiveScene = operation({
  id: 'archiveScene',
  method: 'POST',
  path: '/api/v1/scenes/{id}/archive',
  summary: 'Put a scene away',
  for: 'person',
  limit: 'writing',
  params: byScene,
  status: 200,
  answer: z.object({ scene: sceneSummarySchema }),
})

export const restoreScene = operation({
  id: 'restoreScene',
  method: 'POST',
  path: '/api/v1/scenes/{id}/restore',
  summary: 'Bring an archived scene back',
  for: 'person',
  limit: 'writing',
  params: byScene,
  status: 200,
  answer: z.object({ scene: sceneSummarySchema }),
})

export const sceneThumbnail = operation({
  id: 'sceneThumbnail',
  method: 'GET',
  path: '/api/v1/scenes/{id}/thumbnail.png',
  summary: 'A small picture of the scene at its saved angle and view',
  for: 'person',
  limit: 'reading',
  params: byScene,
  query: z.object({
    version: z.coerce.number().int().min(1).optional(),
    theme: themeSchema.default('light'),
  }),
  status: 200,
  media: 'image/png',
})

export const presetPoster = operation({
  id: 'presetPoster',
  method: 'GET',
  path: '/api/v1/presets/{id}/poster.png',
  summary: 'A picture of a preset',
  for: 'anyone',
  limit: 'shared',
  params: z.object({ id: z.string() }),
  query: z.object({ theme: themeSchema.default('light') }),
  status: 200,
  media: 'image/png',
})

export const sceneOperations = [
  listScenes,
  createScene,
  openScene,
  renameScene,
  listVersions,
  saveVersion,
  openVersion,
  duplicateScene,
  archiveScene,
  restoreScene,
  sceneThumbnail,
  presetPoster,
]
