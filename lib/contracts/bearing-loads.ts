import { z } from 'zod'
import { bearingKinds } from '@/lib/mechanics/loads/bearings'
import { loadParts } from '@/lib/mechanics/loads/part-signals'
import { cautionsSchema, loadRequest } from './load-request'
import { operation } from './operation'

const number = z.number()
const signal = z.array(number)

const load = z.object({
  /** Fixed in the block. For a pin, a rod and a knuckle what presses on the journal, for a main what the journal presses with. */
  verticalN: signal,
  horizontalN: signal,
  /** Turning with the journal: towards its own 0° (the throw; the crank's 0°; along the master rod) and 90° on in the direction of rotation. */
  radialN: signal,
  tangentialN: signal,
  peakN: number,
  peakAtDeg: number,
  meanN: number,
  /** Peak on the projected area d·l; null without a size. */
  peakMPa: number.nullable(),
})

const sector = z.object({
  fromDeg: number,
  toDeg: number,
  middleDeg: number,
  meanN: number,
  shareOfMean: number,
})

export const bearingLoadsSchema = z
  .object({
    angleDeg: signal,
    bearings: z.array(
      z.object({
        kind: z.enum(bearingKinds),
        id: z.string(),
        areaMm2: number.nullable(),
        gas: load.optional(),
        inertia: load.optional(),
        total: load.optional(),
        /** The 60° of the surface that the total load presses least, from the frame's 0° on in the direction of rotation. */
        leastLoaded: z.object({
          /** On the journal: where an oil hole may sit. */
          journal: sector,
          /** In the block, for a main alone. */
          block: sector.nullable(),
        }),
      }),
    ),
    cautions: cautionsSchema,
  })
  .meta({ id: 'BearingLoads' })
export type BearingLoadsAnswer = z.output<typeof bearingLoadsSchema>

export const bearingLoads = operation({
  id: 'bearingLoads',
  method: 'POST',
  path: '/api/v1/bearing-loads',
  summary: 'Polar loads of every pin, rod and main over one cycle, and where each is least loaded',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    ...loadRequest,
    include: z.array(z.enum(loadParts)).default([...loadParts]),
  }),
  status: 200,
  answer: bearingLoadsSchema,
})
