import { z } from 'zod'
import { quantities, type Quantity } from '@/lib/units/quantities'
import { units, type UnitName } from '@/lib/units/units'
import { idSchema } from './common'
import { operation } from './operation'
import { messageSchema, openedSceneSchema, versionSummarySchema } from './scenes'

const versionNumber = z.int().min(1)
const asked = z.coerce.number().int().min(1)

/** A figure in the unit beside it, words, or nothing where there is none. */
const value = z.union([z.number(), z.string()]).nullable()

const changed = {
  name: z.string(),
  /** What is measured; null for words, names and choices. */
  quantity: z.enum(Object.keys(quantities) as Quantity[]).nullable(),
  unit: z.enum(Object.keys(units) as UnitName[]),
  was: value,
  now: value,
}

const sceneChange = z.object({
  key: z.string(),
  /** Where in the document: keys, and "#" with the name of an entry of a list. Several where all were changed alike. */
  paths: z.array(z.array(z.string()).readonly()),
  ...changed,
  is: z.enum(['changed', 'added', 'removed']),
  /** Both values read alike as they are usually shown. */
  belowPrecision: z.boolean(),
})

const effect = z.object({
  ...changed,
  /** The limit that the newer figure does not keep, in the same unit. */
  below: z.number().nullable(),
})

const partIds = z.array(z.string())

export const versionChangesSchema = z
  .object({
    from: versionSummarySchema,
    to: versionSummarySchema,
    /** The speed that effects are worked out at. */
    speedRpm: z.number(),
    /** What was set otherwise, each with the drawn parts it is about and with what follows from it alone. */
    parameters: z.array(sceneChange.extend({ parts: partIds, effects: z.array(effect) })),
    /** Changes of how it is looked at alone. */
    view: z.array(sceneChange),
    /** What follows from several changes together. */
    effects: z.array(effect),
    /** Parts that the drawing shows otherwise, by their ids. */
    drawn: z.object({ changed: partIds, added: partIds, removed: partIds }),
  })
  .meta({ id: 'VersionChanges' })
export type VersionChangesAnswer = z.output<typeof versionChangesSchema>

export const compareVersions = operation({
  id: 'compareVersions',
  method: 'GET',
  path: '/api/v1/scenes/{id}/changes',
  summary: 'What changed between two versions of a scene, and what follows from it',
  for: 'person',
  limit: 'analyses',
  params: z.object({ id: idSchema }),
  query: z.object({
    from: asked,
    to: asked,
    /** For the effects; the newer engine's greatest speed unless asked otherwise. */
    speedRpm: z.coerce.number().min(0).max(200_000).optional(),
    /** In which units it is judged what reads alike. */
    units: z.enum(['si', 'us']).default('si'),
  }),
  status: 200,
  answer: versionChangesSchema,
})

export const restoreVersion = operation({
  id: 'restoreVersion',
  method: 'POST',
  path: '/api/v1/scenes/{id}/versions/{number}/restore',
  summary: 'A new version that is as an older one was',
  for: 'person',
  limit: 'writing',
  params: z.object({ id: idSchema, number: asked }),
  body: z.object({
    /** The head that it comes on top of. */
    base: versionNumber,
    /** Why, after "Restored from version n". */
    message: messageSchema.max(440).default(''),
  }),
  idempotent: true,
  status: 201,
  answer: openedSceneSchema,
  problems: { 409: 'The base is not the head: the answer carries `head`, `base` and `yours`' },
})

export const versionOperations = [compareVersions, restoreVersion]
