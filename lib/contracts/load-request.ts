import { z } from 'zod'
import { LEAST_STEP_DEG } from '@/lib/mechanics/analysis'
import { arrivingDocument } from './documents'

/** What every request for loads over a cycle names. */
export const loadRequest = {
  train: arrivingDocument('CrankTrainInput'),
  speedRpm: z.number().positive().max(100_000),
  /** Between the angles of the answer; divides 360. Peaks and means are taken at most 1° apart all the same. */
  stepDeg: z
    .number()
    .min(LEAST_STEP_DEG)
    .max(360)
    .refine((step) => Math.abs(Math.round(360 / step) * step - 360) < 1e-6, {
      error: (issue) => `${String(issue.input)}° does not divide 360°.`,
      params: { fix: 'Give a step such as 0.5, 1, 2 or 5.' },
    })
    .default(1),
}

/** What the figures leave out, and what comes before them. */
export const cautionsSchema = z.array(z.object({ code: z.string(), message: z.string() }))
