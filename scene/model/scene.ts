import { z } from 'zod'
import { crankTrainSchema } from './crank-train'

/** The scene document, format "scene/1": one crank train plus how it is looked at. */
export const cameraSchema = z.object({
  yawDeg: z.number(),
  pitchDeg: z.number().min(-90).max(90),
  distanceMm: z.number().positive(),
  targetMm: z.tuple([z.number(), z.number(), z.number()]),
})

export const partGroups = ['crank', 'rods', 'pistons', 'bores', 'flywheel', 'shafts'] as const

export const overlaysSchema = z.object({
  /** Which force vectors stand on pistons, crank pins and mains. */
  gas: z.boolean(),
  inertia: z.boolean(),
  total: z.boolean(),
  on: z.object({ pistons: z.boolean(), crankPins: z.boolean(), mains: z.boolean() }),
  /** Resultant shaking force and couple, and the path its tip draws over a cycle. */
  shaking: z.boolean(),
  orbit: z.boolean(),
  firing: z.boolean(),
  pressure: z.boolean(),
  labels: z.boolean(),
})

export const viewSchema = z.object({
  angleDeg: z.number(),
  speedRpm: z.number().nonnegative(),
  /** The shown clock runs at speed / slowdown: 1 … 2000. */
  slowdown: z.number().min(1).max(2000),
  reverse: z.boolean(),
  playing: z.boolean(),
  /** Null frames the whole engine from the default direction. */
  camera: cameraSchema.nullable(),
  hidden: z.array(z.enum(partGroups)),
  ghost: z.array(z.enum(partGroups)),
  /** Section plane across the crank at this place, or none. */
  sectionAxialMm: z.number().nullable(),
  overlays: overlaysSchema,
})

export const sceneSchema = z.object({
  format: z.literal('scene/1'),
  train: crankTrainSchema,
  view: viewSchema,
})

export type Scene = z.output<typeof sceneSchema>
export type SceneView = z.output<typeof viewSchema>
export type SceneCamera = z.output<typeof cameraSchema>
export type Overlays = z.output<typeof overlaysSchema>
export type PartGroupName = (typeof partGroups)[number]
