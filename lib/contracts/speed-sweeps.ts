import { z } from 'zod'
import { arrivingDocument } from './documents'
import { cautionsSchema } from './load-request'
import { operation } from './operation'

const number = z.number()
const rpm = z.number().nonnegative().max(100_000)

export const speedSweepSchema = z
  .object({
    /** The document's maximum speed. */
    redlineRpm: number.nullable(),
    /** What an end that was not asked for was taken from. */
    bounds: z.object({
      from: z.enum(['asked', 'idle', 'tenth']),
      to: z.enum(['asked', 'max', 'rated', 'piston-speed']),
    }),
    points: z.array(
      z.object({
        speedRpm: number,
        /** Shaking force and couple of an order: major semi-axis, |forward| + |backward|. */
        force1N: number,
        force2N: number,
        couple1Nm: number,
        couple2Nm: number,
        /** Greatest of any piston. */
        accelerationMS2: number,
        accelerationG: number,
        /** Greatest pull and push along any rod, 0 or more. */
        rodTensionN: number,
        rodCompressionN: number,
        /** Greatest load of any pin with all its rods, and of any main; 0 with fewer than two mains. */
        pinN: number,
        mainN: number,
        meanPistonSpeedMS: number,
        meanTorqueNm: number,
        powerKW: number,
      }),
    ),
    cautions: cautionsSchema,
  })
  .meta({ id: 'SpeedSweep' })
export type SpeedSweepAnswer = z.output<typeof speedSweepSchema>

export const speedSweep = operation({
  id: 'speedSweep',
  method: 'POST',
  path: '/api/v1/speed-sweeps',
  summary: 'Forces, couples, loads and power of a crank train from idle to over-speed',
  for: 'anyone',
  limit: 'analyses',
  body: z
    .object({
      train: arrivingDocument('CrankTrainInput'),
      fromRpm: rpm.optional(),
      toRpm: rpm.optional(),
      count: z.int().min(2).max(500).default(50),
    })
    .refine(({ fromRpm = 0, toRpm = Infinity }) => fromRpm < toRpm, {
      path: ['toRpm'],
      error: 'The sweep ends at or below the speed it begins at.',
      params: { fix: 'Give an end above the beginning.' },
    }),
  status: 200,
  answer: speedSweepSchema,
})
