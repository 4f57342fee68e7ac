import { z } from 'zod'
import { arrivingDocument } from './documents'
import { operation } from './operation'

const degrees = z.number()
const count = z.int()

const rankedOrder = z.object({
  order: z.array(z.string()),
  intervalsDeg: z.array(degrees),
  /** Greatest less least interval, and the root mean square of what they differ from their mean by. */
  spreadDeg: degrees,
  rmsDeg: degrees,
  /** Firings in succession, all the way round: on one bank, on one throw, on neighbouring throws. */
  sameBank: count,
  sameThrow: count,
  adjacentThrow: count,
  sameOrAdjacentThrow: count,
  /** The worst spread of intervals within one of the train's collectors. */
  collectorSpreadDeg: degrees,
})

export const firingOrdersSchema = z
  .object({
    orders: z.array(rankedOrder),
    /** How many legal orders were seen; more than are listed when the list was cut. */
    found: count,
    /** False when the search stopped with orders left unseen. */
    complete: z.boolean(),
  })
  .meta({ id: 'FiringOrders' })
export type FiringOrdersAnswer = z.output<typeof firingOrdersSchema>

export const listFiringOrders = operation({
  id: 'listFiringOrders',
  method: 'POST',
  path: '/api/v1/firing-orders',
  summary: 'Every firing order that a crank train allows, best first',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train: arrivingDocument('CrankTrainInput'),
    /** Only orders whose intervals are equal within 0.5°. */
    even: z.boolean().default(true),
  }),
  status: 200,
  answer: firingOrdersSchema,
})

const phasing = z.object({
  order: z.array(z.string()),
  throws: z.array(z.object({ id: z.string(), angleDeg: degrees })),
})

export const phasingSchema = z
  .object({
    proposal: phasing,
    /** The order backwards, for the mirrored crank; null where shared throws do not allow it. */
    mirror: phasing.nullable(),
  })
  .meta({ id: 'Phasing' })
export type PhasingAnswer = z.output<typeof phasingSchema>

export const proposePhasing = operation({
  id: 'proposePhasing',
  method: 'POST',
  path: '/api/v1/firing-orders/phasing',
  summary: 'Throw angles with which a crank train fires in a wanted order',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train: arrivingDocument('CrankTrainInput'),
    order: z.array(z.string()).max(64),
    /** From each cylinder of the order to the next; even where left out. */
    intervalsDeg: z.array(degrees).max(64).optional(),
  }),
  status: 200,
  answer: phasingSchema,
})

export const collectorsSchema = z
  .object({
    /** The blow-down window the overlaps are for: exhaust opening after firing top dead centre, and its length. */
    window: z.object({ opensDeg: degrees, lengthDeg: degrees }),
    groupings: z.array(
      z.object({
        groups: z.array(
          z.object({
            cylinders: z.array(z.string()),
            intervalsDeg: z.array(degrees),
            spreadDeg: degrees,
            /** In firing order: since the last pulse of the collector, and how much of the window others share. */
            pulses: z.array(z.object({ cylinder: z.string(), gapDeg: degrees, overlapDeg: degrees })),
            gapSpreadDeg: degrees,
            overlapSpreadDeg: degrees,
            worstCylinder: z.string(),
          }),
        ),
        worstSpreadDeg: degrees,
        totalSpreadDeg: degrees,
        overlapDeg: degrees,
        /** Banks that a collector takes from beyond its first, over all collectors. */
        crossings: count,
      }),
    ),
    complete: z.boolean(),
  })
  .meta({ id: 'Collectors' })
export type CollectorsAnswer = z.output<typeof collectorsSchema>

export const groupCollectors = operation({
  id: 'groupCollectors',
  method: 'POST',
  path: '/api/v1/collectors',
  summary: 'The best groupings of the cylinders into a number of exhaust collectors',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train: arrivingDocument('CrankTrainInput'),
    count: z.int().min(1).max(8),
    exhaustOpensDeg: z.number().min(0).max(720).optional(),
    windowDeg: z.number().positive().max(720).optional(),
  }),
  status: 200,
  answer: collectorsSchema,
})

export const firingOperations = [listFiringOrders, proposePhasing, groupCollectors]
