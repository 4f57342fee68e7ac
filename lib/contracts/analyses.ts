import { z } from 'zod'
import { analysisParts } from '@/lib/mechanics/analysis'
import { cautionsSchema, loadRequest } from './load-request'
import { operation } from './operation'

const number = z.number()
const signal = z.array(number)
const by = <S extends z.ZodType>(schema: S) => z.record(z.string(), schema)
const force = z.object({ amplitudeN: number, phaseDeg: number })
const couple = z.object({ amplitudeNm: number, phaseDeg: number })
const intervals = z.object({ intervalsDeg: signal, even: z.boolean() })

/** Every figure of one analysis, in the units its names state; signals have a value for each of `angleDeg`. */
export const analysisSchema = z
  .object({
    train: z.object({
      title: z.string(),
      cylinderCount: z.int(),
      displacementCc: number,
      meanPistonSpeedMS: number,
    }),
    angleDeg: signal,
    kinematics: by(
      z.object({
        pinHeightMm: signal,
        travelMm: signal,
        velocityMS: signal,
        accelerationMS2: signal,
        rodAngleDeg: signal,
        tdcDeg: number,
        bdcDeg: number,
        strokeMm: number,
      }),
    ).optional(),
    gas: by(z.object({ pressureBar: signal })).optional(),
    loads: by(
      z.object({
        gasForceN: signal,
        pistonPinN: z.object({ u: signal, v: signal }),
        sideThrustN: signal,
        crankPinN: z
          .object({ radial: signal, tangential: signal, vertical: signal, horizontal: signal })
          .optional(),
        knuckleN: z.object({ vertical: signal, horizontal: signal }).optional(),
      }),
    ).optional(),
    mains: by(z.object({ vertical: signal, horizontal: signal, peakN: number, meanN: number })).optional(),
    torque: z
      .object({
        gasNm: signal,
        inertiaNm: signal,
        totalNm: signal,
        meanNm: number,
        peakNm: number,
        energyFluctuationJ: number,
      })
      .optional(),
    shaking: z
      .object({
        verticalN: signal,
        horizontalN: signal,
        coupleVerticalNm: signal,
        coupleHorizontalNm: signal,
      })
      .optional(),
    orders: z
      .array(
        z.object({
          order: number,
          vertical: force,
          horizontal: force,
          forwardN: number,
          backwardN: number,
          coupleVertical: couple,
          coupleHorizontal: couple,
          forwardNm: number,
          backwardNm: number,
          torqueNm: number,
        }),
      )
      .optional(),
    firing: z
      .object({
        events: z.array(z.object({ cylinder: z.string(), angleDeg: number })),
        intervalsDeg: signal,
        even: z.boolean(),
        banks: by(intervals),
        collectors: by(intervals),
        alternatesBanks: z.boolean(),
      })
      .optional(),
    balance: z
      .object({
        cylinders: by(z.object({ reciprocatingKg: number, rotatingKg: number })),
        bobWeights: by(z.object({ kg: number, reciprocatingKg: number, rotatingKg: number, oilKg: number })),
        residual: z.object({
          staticKgMm: number,
          staticAngleDeg: number,
          coupleKgMm2: number,
          coupleAngleDeg: number,
        }),
        grade: z.object({ permissibleKgMm: number, gradeMmS: number }).nullable(),
      })
      .optional(),
    cautions: cautionsSchema.optional(),
  })
  .meta({ id: 'Analysis' })
export type AnalysisAnswer = z.output<typeof analysisSchema>

export const analyse = operation({
  id: 'analyse',
  method: 'POST',
  path: '/api/v1/analyses',
  summary: 'What a crank train does over one working cycle at a steady speed',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    ...loadRequest,
    include: z.array(z.enum(analysisParts)).default([...analysisParts]),
    /** Balance quality grade of ISO 21940-11, in mm/s. */
    gradeMmS: z.number().positive().max(4000).default(16),
  }),
  status: 200,
  answer: analysisSchema,
})
