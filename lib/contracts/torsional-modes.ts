import { z } from 'zod'
import { arrivingDocument } from './documents'
import { cautionsSchema } from './load-request'
import { operation } from './operation'

const number = z.number()
/** Above 0, at most `most` of them. */
const figures = (most: number) => z.array(number.positive().max(1e15)).min(1).max(most)

export const torsionalModesSchema = z
  .object({
    /** Free end, throws by their place along the crank, flywheel. */
    stations: z.array(z.string()),
    inertias: z.array(number),
    /** From each station to the next. */
    stiffnesses: z.array(number),
    /** Lowest first, without the rigid turn; the greatest of a shape is 1 in size, the free end's is positive. */
    modes: z.array(z.object({ frequencyHz: number, shape: z.array(number) })),
    /** Idle to maximum speed; null where neither a maximum nor a rated speed is entered. */
    runningRpm: z.object({ from: number, to: number }).nullable(),
    criticals: z.array(
      z.object({
        order: number,
        /** 1 is the lowest. */
        mode: number,
        rpm: number,
        /** From 0.85 of the lowest to 1.15 of the greatest running speed; null where that is not known. */
        inRange: z.boolean().nullable(),
        /** Of the cylinders' phase vectors, each as long as the shape is at its throw. */
        vectorSum: number,
      }),
    ),
    assumptions: cautionsSchema,
  })
  .meta({ id: 'TorsionalModes' })
export type TorsionalModesAnswer = z.output<typeof torsionalModesSchema>

export const torsionalModes = operation({
  id: 'torsionalModes',
  method: 'POST',
  path: '/api/v1/torsional-modes',
  summary:
    'Torsional frequencies and shapes of the crank as lumped inertias, and the speeds at which orders meet them',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train: arrivingDocument('CrankTrainInput'),
    shearModulusGPa: number.positive().max(1000).default(79),
    /** Per turn of the crank. Absent: ½, 1 … 12, whole ones for a two-stroke. */
    orders: z.array(number.positive().max(100)).min(1).max(100).optional(),
    /** N m/rad, in place of those by the sizes of the crank. */
    stiffnesses: figures(300).optional(),
    /** kg m², free end, throws by their place along the crank, flywheel: in place of those of the document. */
    inertias: figures(300).optional(),
  }),
  status: 200,
  answer: torsionalModesSchema,
})
