import { z } from 'zod'
import { MOST_CYLINDERS, MOST_KEPT } from '@/lib/mechanics/layouts/find-layouts'
import { operation } from './operation'

const number = z.number()
const count = z.int()
const turning = z.object({ forward: number, backward: number })

/** Figures a wish can be about: each is 0 at best. */
const figures = {
  /** What the counterweights leave of the first order, in F1 and F1·a: F1 = m·r·ω², a the spacing of the throws. */
  firstOrderForce: number,
  firstOrderCouple: number,
  /** In F2 and F2·a: F2 = r/l·F1. */
  secondOrderForce: number,
  secondOrderCouple: number,
  /** The largest of the least counterweights that balance the crank with its bob-weights, as a multiple of m·r. */
  counterweight: number,
  /** Greatest less least firing interval. */
  unevennessDeg: number,
  /** Firings followed by one on the same bank; on the same or the next throw. */
  sameBank: count,
  sameOrNextThrow: count,
}

const layout = z.object({
  bankAngleDeg: number.nullable(),
  /** How far the second bank's pin stands ahead of the first's on one throw. */
  splitDeg: number,
  /** Of each throw, free end first: the first bank's pin. */
  throwAnglesDeg: z.array(number),
  /** Cylinders in firing order, 1 the first. With two rods a throw, throw k carries cylinders 2k − 1 and 2k. */
  order: z.array(count),
  intervalsDeg: z.array(number),
  even: z.boolean(),
  ...figures,
  sameThrow: count,
  /** Orders of this phasing that none of these figures tells apart, this one with them. */
  alike: count,
  /** Of the bare reciprocating masses: F1, F1·a, F2, F2·a. */
  bare: z.object({ force1: turning, couple1: turning, force2: turning, couple2: turning }),
  /** All the least counterweights together, as a multiple of m·r. */
  counterweights: number,
  /** Sum of weight × figure / scale over the wishes; less is better. */
  score: number,
  /** None of the layouts is better in one wish without being worse in another, by a hundredth of its scale. */
  foremost: z.boolean(),
})

const wishNames = Object.keys(figures) as (keyof typeof figures)[]
const wishName = z.enum(wishNames)

export const layoutsSchema = z
  .object({
    /** Best first. */
    layouts: z.array(layout),
    /** Phasings gone through, symmetrical ones taken out, and whole firing orders. */
    evaluated: count,
    orders: count,
    /** Steps that throws were placed on, by even firing first. */
    stepsDeg: z.array(number),
    /** True when the search stopped at its limit with phasings left. */
    capped: z.boolean(),
    /** Where no layout fulfils all limits: the one that misses them by least, and which wishes nothing at all fulfils. */
    nearestMiss: z.object({ layout, missed: z.array(wishName), impossible: z.array(wishName) }).nullable(),
  })
  .meta({ id: 'Layouts' })
export type LayoutsAnswer = z.output<typeof layoutsSchema>

const wish = z.object({
  /** How much the figure counts in the score. */
  weight: number.min(0).max(100).default(1),
  /** Shuts out what is above it. */
  atMost: number.min(0).max(10_000).optional(),
})

export const findLayouts = operation({
  id: 'findLayouts',
  method: 'POST',
  path: '/api/v1/layouts',
  summary: 'Throw angles and firing orders of equal cylinders that come nearest to wishes',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    cylinders: z.int().min(1).max(MOST_CYLINDERS),
    cycle: z.enum(['four-stroke', 'two-stroke']).default('four-stroke'),
    banks: z.literal([1, 2]).default(1),
    /** Angles between the banks, each tried; two banks only. */
    bankAnglesDeg: z.array(number.positive().max(180)).min(1).max(24).default([90]),
    /** With two banks: a rod of either bank on each throw, or one rod with the banks in turn. */
    rodsPerThrow: z.literal([1, 2]).optional(),
    /** How far the second bank's pin stands ahead on a throw with two rods, each tried; 0 is a common pin. */
    splitAnglesDeg: z.array(number.min(-120).max(120)).min(1).max(61).default([0]),
    /** Regular steps of the throw angles beside those that even firing calls for; by the number of throws where left out. */
    stepsDeg: z
      .array(
        number
          .min(5)
          .max(360)
          .refine((step) => Math.abs(Math.round(360 / step) * step - 360) < 1e-6, {
            error: (issue) => `${String(issue.input)}° does not divide 360°.`,
            params: { fix: 'Give steps such as 15, 30, 45 or 72.' },
          }),
      )
      .max(12)
      .optional(),
    /** Between the two rods of a throw, as a share of the spacing of the throws. */
    rodOffset: number.min(0).max(1).default(0),
    /** Share of the reciprocating mass that bob-weights stand for. */
    balanceFactor: number.min(0).max(1).default(0.5),
    /** What rotates with a rod on its pin, its share of the throw with it, as a multiple of what reciprocates. */
    rotatingMass: number.min(0).max(20).default(1),
    wishes: z.partialRecord(wishName, wish).default({}),
    /** The most layouts in the answer. */
    keep: z.int().min(1).max(MOST_KEPT).default(50),
  }),
  status: 200,
  answer: layoutsSchema,
})
