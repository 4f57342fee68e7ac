import { z } from 'zod'
import { cardParts } from '@/lib/mechanics/balance/bob-weight-card'
import { arrivingDocument } from './documents'
import { operation } from './operation'

const number = z.number()
const place = number.min(-100_000).max(100_000)
const length = number.positive().max(20_000)
const degrees = number.min(-3600).max(3600)
const train = arrivingDocument('CrankTrainInput')
const speedRpm = number.positive().max(100_000)
const gradeMmS = number.positive().max(4000).default(16)

const planeSchema = z.object({
  id: z.string().min(1).max(40),
  axialMm: place,
  /** Of the counterweight's centre of gravity. */
  radiusMm: length,
  /** A weight that stays as it is. */
  fixed: z.object({ massKg: number.nonnegative().max(1e6), angleDeg: degrees }).optional(),
})

const weightSchema = z.object({
  id: z.string(),
  axialMm: number,
  angleDeg: number,
  massKg: number,
  radiusMm: number,
})

const residualSchema = z.object({
  staticKgMm: number,
  staticAngleDeg: number,
  coupleKgMm2: number,
  coupleAngleDeg: number,
})

const capacitySchema = z.object({
  id: z.string(),
  momentKgMm: number,
  /** A half disc of the web's radius and thickness. */
  capacityKgMm: number,
  share: number,
  /** What would close it where the share is above 1. */
  slug: z
    .object({ densityKgM3: number, radiusMm: number, volumeCm3: number, massKg: number, diameterMm: number })
    .nullable(),
})

export const solveBalance = operation({
  id: 'solveBalance',
  method: 'POST',
  path: '/api/v1/balance/solve',
  summary: 'Counterweights that leave crank and bob-weights balanced in force and couple, at the least mass',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train,
    /** Absent: the places of the train's counterweights, or its webs where it has none. */
    planes: z.array(planeSchema).max(256).optional(),
    /** Over the whole crank at the least mass, evenly over the whole crank, or bay by bay between the mains. */
    rule: z.enum(['least-mass', 'even', 'bay']).default('least-mass'),
    /** Puts in no web more than its half disc holds. */
    withinCapacity: z.boolean().default(false),
    /** The web and the metal of slugs; absent figures come from the train's shape, or proportions of its bore. */
    web: z
      .object({
        outerRadiusMm: length.optional(),
        thicknessMm: length.optional(),
        densityKgM3: number.min(1000).max(25_000).optional(),
      })
      .default({}),
    slug: z
      .object({ densityKgM3: number.min(1000).max(25_000).default(18_000), radiusMm: length.optional() })
      .prefault({}),
  }),
  status: 200,
  answer: z
    .object({
      /** Ready to stand in the train as it is. */
      counterweights: z.array(weightSchema),
      residual: residualSchema,
      totalMassKg: number,
      /** Nothing lighter balances in these planes. */
      leastMassKg: number,
      capacity: z.array(capacitySchema),
      web: z.object({ outerRadiusMm: number, thicknessMm: number, densityKgM3: number, stated: z.boolean() }),
    })
    .meta({ id: 'SolvedBalance' }),
})

const planePair = z.tuple([place, place]).refine(([a, b]) => a !== b, {
  error: 'The two planes stand at one place.',
  params: { fix: 'Give two places along the crank.' },
})

const planeResidual = z.object({
  axialMm: number,
  unbalanceKgMm: number,
  angleDeg: number,
  permissibleKgMm: number.nullable(),
  within: z.boolean().nullable(),
})

const changeSchema = z.object({
  /** Absent: every cylinder. */
  cylinders: z.array(z.string()).min(1).max(64).optional(),
  moves: z.enum(['reciprocating', 'rotating']),
  massKg: number.min(-1e6).max(1e6),
})

export const residualBalance = operation({
  id: 'residualBalance',
  method: 'POST',
  path: '/api/v1/balance/residual',
  summary:
    'Residual unbalance in two planes against ISO 21940-11, and what a change of a part’s mass makes of it',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train,
    /** Absent: the outermost mains, or throws where there are fewer than two mains. */
    planesMm: planePair.optional(),
    /** Where the crank's centre of gravity lies; absent: half-way between the planes. */
    centreMm: place.optional(),
    gradeMmS,
    /** Absent: the train's greatest speed. */
    speedRpm: speedRpm.optional(),
    change: changeSchema.optional(),
  }),
  status: 200,
  answer: z
    .object({
      residual: residualSchema,
      grade: z.object({ gradeMmS: number, speedRpm: number, permissibleKgMm: number }).nullable(),
      planes: z.tuple([planeResidual, planeResidual]),
      changed: z
        .object({
          residual: residualSchema,
          planes: z.tuple([planeResidual, planeResidual]),
          change: residualSchema,
          /** Of the change alone, at the speed. */
          forceN: number.nullable(),
          coupleNm: number.nullable(),
          /** Added to the first-order force along the bore of each changed cylinder. */
          alongBoreN: number.nullable(),
        })
        .nullable(),
    })
    .meta({ id: 'ResidualBalance' }),
})

const rowSchema = z.object({
  part: z.enum(cardParts),
  moves: z.enum(['reciprocating', 'rotating']),
  quantity: z.int(),
  eachKg: number,
  totalKg: number,
  cylinders: z.array(z.string()),
})

export const bobWeightCard = operation({
  id: 'bobWeightCard',
  method: 'POST',
  path: '/api/v1/balance/card',
  summary: 'The bob-weight card of every throw, line by line, with the balance factor in both definitions',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({ train }),
  status: 200,
  answer: z
    .object({
      throws: z.array(
        z.object({
          throw: z.string(),
          rows: z.array(rowSchema),
          reciprocatingKg: number,
          rotatingKg: number,
          oilKg: number,
          totalKg: number,
          /** Share of all the reciprocating mass on the pin, and of one cylinder's. */
          factor: z.object({ ofAll: number, ofOne: number.nullable() }),
        }),
      ),
    })
    .meta({ id: 'BobWeightCards' }),
})

const shaftSchema = z.object({
  id: z.string(),
  speedRatio: z.literal([-2, -1, 1, 2]),
  angleDeg: number,
  unbalanceKgMm: number,
  axialMm: number,
  horizontalMm: number,
  verticalMm: number,
})

const turningSchema = z.object({
  forward: number,
  forwardAngleDeg: number,
  backward: number,
  backwardAngleDeg: number,
  major: number,
  minor: number,
  tiltDeg: number,
})

export const designBalanceShafts = operation({
  id: 'designBalanceShafts',
  method: 'POST',
  path: '/api/v1/balance/shafts',
  summary: 'Balance shafts that remove what turns backward at crank speed, or what shakes at twice it',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({
    train,
    order: z.literal([1, 2]),
    remove: z.enum(['force', 'couple', 'both']),
    /** One or two places along the crank; absent: the outermost cylinders, or the middle for a force. */
    placesMm: z.array(place).min(1).max(2).optional(),
    horizontalMm: place.default(0),
    verticalMm: place.default(0),
    speedRpm: speedRpm.default(1000),
  }),
  status: 200,
  answer: z
    .object({
      /** To be added to the train's own. */
      balanceShafts: z.array(shaftSchema),
      /** Of that order, N and N m at the speed. */
      before: z.object({ force: turningSchema, couple: turningSchema }),
      after: z.object({ force: turningSchema, couple: turningSchema }),
    })
    .meta({ id: 'BalanceShafts' }),
})

const ordersSchema = z.array(z.object({ order: number, force: turningSchema, couple: turningSchema }))

export const balanceOrders = operation({
  id: 'balanceOrders',
  method: 'POST',
  path: '/api/v1/balance/orders',
  summary:
    'Orders 1, 2, 4 and 6 of shaking force and couple, forward and backward, exact and by the textbook’s first term',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({ train, speedRpm }),
  status: 200,
  answer: z
    .object({
      /** N and N m at the speed: the engine as it stands, and without counterweights and balance shafts. */
      exact: ordersSchema,
      textbook: ordersSchema,
      bare: ordersSchema,
      /** The reciprocating masses alone, each order in units of one cylinder's first term of it, couples of that times the spacing. */
      layout: z.object({
        forceN: number,
        ratio: number,
        spacingMm: number.nullable(),
        alike: z.boolean(),
        exact: ordersSchema,
        textbook: ordersSchema,
      }),
      verdict: z.array(
        z.object({
          remedy: z.enum(['counterweights', 'counter-turning shaft', 'shafts at twice the speed']),
          kind: z.enum(['force', 'couple']),
          /** N or N m: of the bare crank, and left now. */
          bare: number,
          left: number,
        }),
      ),
    })
    .meta({ id: 'BalanceOrders' }),
})

export const balanceOperations = [
  solveBalance,
  residualBalance,
  bobWeightCard,
  designBalanceShafts,
  balanceOrders,
] as const
