import { z } from 'zod'
import { namedViews } from './named-views'
import { cameraSchema, overlaysSchema, partGroups } from './scene'

/** What can be pinned beside the parts of the engine: the resultants drawn on the whole of it. */
export const vectorIds = ['vector:total-force', 'vector:total-couple'] as const
export type VectorId = (typeof vectorIds)[number]

export const isVectorId = (partId: string): partId is VectorId =>
  (vectorIds as readonly string[]).includes(partId)

const millimetres = z.number().min(-200_000).max(200_000)

/** Where a note is pinned: a point on a part, at a crank angle, and the view it was seen in. */
export const anchorSchema = z.object({
  version: z.int().min(1),
  /** A part's id, such as "piston:3", or one of `vectorIds`. */
  partId: z.string().min(1).max(120),
  /** In the part's own coordinates, which ride with it; a vector's are the engine's. */
  pointMm: z.tuple([millimetres, millimetres, millimetres]),
  /** Within one cycle. */
  angleDeg: z.number().nonnegative().lt(720),
  playing: z.boolean(),
  speedRpm: z.number().nonnegative().max(200_000),
  camera: cameraSchema,
  /** The named view that the camera stood in, if it was one. */
  view: z.enum(namedViews).nullable(),
  hidden: z.array(z.enum(partGroups)).max(partGroups.length),
  ghost: z.array(z.enum(partGroups)).max(partGroups.length),
  overlays: overlaysSchema,
  sectionAxialMm: z.number().nullable(),
  units: z.enum(['si', 'us']),
})

export type Anchor = z.output<typeof anchorSchema>

/** How a pinned part stands in another version: as it was, changed, or not there. */
export const standings = ['same', 'changed', 'gone'] as const
export type Standing = (typeof standings)[number]

/** A parameter of a pinned part in both versions, as it is shown. */
export const partChangeSchema = z.object({
  name: z.string(),
  from: z.string(),
  to: z.string(),
  unit: z.string(),
})
export type PartChange = z.output<typeof partChangeSchema>
