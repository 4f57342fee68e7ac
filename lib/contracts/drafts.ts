import { z } from 'zod'
import { idSchema, timeSchema } from './common'
import { arrivingDocument, sceneDocument } from './documents'
import { operation } from './operation'

const baseVersion = z.int().min(1).nullable()

export const draftSchema = z
  .object({ document: sceneDocument, base: baseVersion, updatedAt: timeSchema })
  .meta({ id: 'Draft' })
export type DraftAnswer = z.output<typeof draftSchema>

const draftBody = z.object({ base: baseVersion.default(null), document: arrivingDocument('SceneInput') })
const read = { status: 200, answer: z.object({ draft: draftSchema.nullable() }) } as const
const kept = { status: 200, answer: z.object({ updatedAt: timeSchema }) } as const
const byScene = z.object({ id: idSchema })

const ofScene = { path: '/api/v1/scenes/{id}/draft', for: 'person', params: byScene } as const
const unsaved = { path: '/api/v1/draft', for: 'person' } as const

export const readSceneDraft = operation({
  ...ofScene,
  ...read,
  id: 'readSceneDraft',
  method: 'GET',
  summary: "The person's own unsaved work on a scene",
  limit: 'reading',
})

export const keepSceneDraft = operation({
  ...ofScene,
  ...kept,
  id: 'keepSceneDraft',
  method: 'PUT',
  summary: 'Keep unsaved work on a scene',
  limit: 'writing',
  body: draftBody,
})

export const dropSceneDraft = operation({
  ...ofScene,
  id: 'dropSceneDraft',
  method: 'DELETE',
  summary: 'Forget unsaved work on a scene',
  limit: 'writing',
  status: 204,
})

export const readDraft = operation({
  ...unsaved,
  ...read,
  id: 'readDraft',
  method: 'GET',
  summary: "The person's own work that is no scene yet",
  limit: 'reading',
})

export const keepDraft = operation({
  ...unsaved,
  ...kept,
  id: 'keepDraft',
  method: 'PUT',
  summary: 'Keep work that is no scene yet',
  limit: 'writing',
  body: draftBody,
})

export const dropDraft = operation({
  ...unsaved,
  id: 'dropDraft',
  method: 'DELETE',
  summary: 'Forget work that is no scene yet',
  limit: 'writing',
  status: 204,
})

export const draftOperations = [
  readSceneDraft,
  keepSceneDraft,
  dropSceneDraft,
  readDraft,
  keepDraft,
  dropDraft,
]
