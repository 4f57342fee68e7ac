import { z } from 'zod'
import { figureIds } from '@/lib/mechanics/explain/explain'
import { arrivingDocument } from './documents'
import { operation } from './operation'

const id = z.string().min(1).max(40)

/** What stands behind one figure; `value` is unrounded and in `unit`. */
export const explanationSchema = z
  .object({
    figure: z.enum(figureIds),
    title: z.string(),
    quantity: z.string(),
    formula: z.string(),
    symbols: z.array(z.object({ symbol: z.string(), name: z.string(), value: z.number(), unit: z.string() })),
    substituted: z.string(),
    value: z.number(),
    unit: z.string(),
    beside: z.object({ name: z.string(), value: z.number(), unit: z.string() }).optional(),
    assumptions: z.array(z.string()),
    method: z.object({ name: z.string(), version: z.string() }),
    source: z.string(),
  })
  .meta({ id: 'Explanation' })
export type ExplanationAnswer = z.output<typeof explanationSchema>

export const explain = operation({
  id: 'explain',
  method: 'POST',
  path: '/api/v1/explanations',
  summary: 'What stands behind one figure of a crank train: formula, values put in, assumptions, source',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train: arrivingDocument('CrankTrainInput'),
    speedRpm: z.number().positive().max(100_000),
    figure: z.enum(figureIds),
    angleDeg: z.number().min(-3600).max(3600).default(0),
    cylinder: id.optional(),
    throw: id.optional(),
    main: id.optional(),
    bank: id.optional(),
    collector: id.optional(),
    counterweight: id.optional(),
    /** Of a pair of cylinders, the second. */
    other: id.optional(),
    /** Per crank revolution. */
    order: z.number().positive().max(12).optional(),
    /** The crank without counterweights and balance shafts. */
    bare: z.boolean().optional(),
    /** Balance quality grade of ISO 21940-11, in mm/s. */
    gradeMmS: z.number().positive().max(4000).optional(),
    /** Wanted coefficient of speed fluctuation. */
    fluctuation: z.number().positive().max(1).optional(),
    /** Of flywheel and free end; the train's own where not given. */
    inertiaKgM2: z.number().positive().max(1e9).optional(),
    /** Two balancing planes along the crank, the asked one first; the outermost bearings where not given. */
    planeMm: z.number().min(-100_000).max(100_000).optional(),
    otherPlaneMm: z.number().min(-100_000).max(100_000).optional(),
    /** Of a slug of heavier metal, in kg/m³. */
    slugDensity: z.number().gt(7850).max(25_000).optional(),
  }),
  status: 200,
  answer: explanationSchema,
})
