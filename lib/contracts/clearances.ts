import { z } from 'zod'
import { arrivingDocument } from './documents'
import { operation } from './operation'

const change = z.object({ path: z.array(z.union([z.string(), z.number()])).readonly(), value: z.unknown() })

export const clearancesSchema = z
  .object({
    /** The tightest against its limit first. */
    clearances: z.array(
      z.object({
        kind: z.enum([
          'skirt-counterweight',
          'skirt-web',
          'bank-bank',
          'rod-bore',
          'rod-rod',
          'piston-deck',
          'bore-wall',
        ]),
        /** Of the drawing, such as "piston:1" and "counterweight:1F". */
        parts: z.tuple([z.string(), z.string()]),
        leastMm: z.number(),
        /** Crank angle of the least gap, 0 to 360; null where nothing moves. */
        angleDeg: z.number().nullable(),
        limitMm: z.number(),
        status: z.enum(['clear', 'close', 'touches']),
        message: z.string(),
        /** What the figure takes for granted. */
        assumes: z.string(),
        /** Changes of the train's document that would keep the limit, each by itself; empty where it is kept. */
        mends: z.array(z.object({ label: z.string(), changes: z.array(change) })),
      }),
    ),
    notKnown: z.array(z.object({ name: z.string(), why: z.string() })),
  })
  .meta({ id: 'Clearances' })
export type ClearancesAnswer = z.output<typeof clearancesSchema>

export const listClearances = operation({
  id: 'listClearances',
  method: 'POST',
  path: '/api/v1/clearances',
  summary: 'The least gaps between moving parts over a turn of the crank, and where they are',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({ train: arrivingDocument('CrankTrainInput') }),
  status: 200,
  answer: clearancesSchema,
})
