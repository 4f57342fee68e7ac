import { z } from 'zod'
import { cautionsSchema, loadRequest } from './load-request'
import { operation } from './operation'

const number = z.number()
const signal = z.array(number)
const by = <S extends z.ZodType>(schema: S) => z.record(z.string(), schema)

const moment = z.object({
  gasNm: signal,
  inertiaNm: signal,
  totalNm: signal,
  meanNm: number,
  mostNm: number,
  mostAtDeg: number,
  leastNm: number,
  leastAtDeg: number,
  /** What the total gives over its mean and takes back again. */
  energyFluctuationJ: number,
})

/** A·cos(kθ − phase). */
const wave = z.object({ amplitudeNm: number, phaseDeg: number })

export const turningMomentSchema = z
  .object({
    angleDeg: signal,
    cylinders: by(moment),
    banks: by(moment),
    engine: moment,
    /** Mean × speed. */
    powerKW: number,
    flywheel: z.object({
      /** Flywheel and free end of the document together; null where both are 0. */
      inertiaKgM2: number.nullable(),
      /** (greatest − least speed) ÷ mean speed with it. */
      speedFluctuation: number.nullable(),
      wanted: z.object({ speedFluctuation: number, inertiaKgM2: number }).nullable(),
    }),
    orders: z.array(
      z.object({
        order: number,
        gas: wave,
        inertia: wave,
        total: wave,
        /** Unit vectors at order × firing angle, by cylinder, and the length and angle of their sum; major when all are in phase. */
        star: z.object({ anglesDeg: by(number), sum: number, sumAngleDeg: number, major: z.boolean() }),
      }),
    ),
    /** What the two-mass rod leaves out, for every rod whose inertia is entered. */
    rodCouples: by(
      z.object({
        inertiaKgMm2: number,
        twoMassKgMm2: number,
        errorKgMm2: number,
        peakNm: number,
        peakAtDeg: number,
      }),
    ),
    cautions: cautionsSchema,
  })
  .meta({ id: 'TurningMoment' })
export type TurningMomentAnswer = z.output<typeof turningMomentSchema>

export const turningMoment = operation({
  id: 'turningMoment',
  method: 'POST',
  path: '/api/v1/turning-moment',
  summary: 'Torque by cylinder, bank and engine, its harmonics, and the flywheel it asks for',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    ...loadRequest,
    /** Wanted (greatest − least speed) ÷ mean speed: a flywheel for it is in the answer. */
    speedFluctuation: z.number().positive().max(1).optional(),
  }),
  status: 200,
  answer: turningMomentSchema,
})
