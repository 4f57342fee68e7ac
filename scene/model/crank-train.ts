import { z } from 'zod'
import { engineClassNames } from './class-ranges'

/**
 * The crank-train document, format "crank-train/1": its shape, in the units its key names state, and how large a
 * number may be at all (wide enough for any engine built, narrow enough that no sum of them overflows).
 * What a well-shaped document can still get wrong (a rod too short to turn, an order that cannot be) is
 * judged by `readTrain`, which is the only door into the kernel.
 */
const between = (least: number, greatest: number) => z.number().min(least).max(greatest)
const upTo = (greatest: number) => z.number().nonnegative().max(greatest)
const positiveUpTo = (greatest: number) => z.number().positive().max(greatest)

const id = z.string().min(1).max(40)
const length = between(0.001, 20_000) // mm
const anyLength = upTo(20_000)
const offset = between(-20_000, 20_000)
const place = between(-100_000, 100_000)
const angle = between(-3600, 3600) // degrees
const mass = positiveUpTo(1e6) // kg
const anyMass = upTo(1e6)
const unbalance = between(-1e9, 1e9) // kg mm
const speed = between(0.1, 200_000) // rpm
const pressure = positiveUpTo(10_000) // bar

/** What a document may hold at most. */
export const most = { cylinders: 64, tracePoints: 20_000, entries: 256 } as const
const listOf = <T extends z.ZodType>(entry: T) => z.array(entry).max(most.entries)

export const rodSchema = z.object({
  massKg: mass,
  cgFromBigEndMm: anyLength,
  inertiaKgMm2: positiveUpTo(1e15).optional(),
})

const cylinderFields = {
  boreMm: length,
  strokeMm: length,
  rodLengthMm: length,
  offsetMm: offset,
  compressionRatio: z.number().gt(1).max(100),
}

const massFields = {
  pistonKg: mass,
  pistonPinKg: anyMass,
  ringsKg: anyMass,
  locksKg: anyMass,
  rod: rodSchema,
  bigEndBearingKg: anyMass,
  oilAllowanceKg: anyMass,
}

export const linkSchema = z.object({
  master: id,
  knuckleRadiusMm: length,
  knuckleAngleDeg: angle,
})

export const cylinderSchema = z.object({
  id,
  bank: id,
  throw: id,
  axialMm: place,
  link: linkSchema.optional(),
  firesAtDeg: z.number().nonnegative().lt(720).optional(),
  ...z.object({ ...cylinderFields, ...massFields }).partial().shape,
})

export const gasSchema = z.discriminatedUnion('model', [
  z.object({ model: z.literal('none') }),
  z.object({
    model: z.literal('trace'),
    angleDeg: z.array(angle).max(most.tracePoints),
    pressureBar: z.array(upTo(10_000)).max(most.tracePoints),
  }),
  z.object({
    model: z.literal('heat-release'),
    intakePressureBar: pressure,
    exhaustPressureBar: pressure,
    gamma: z.number().gt(1).lt(2),
    heatPerCycleJ: upTo(1e12),
    combustionStartDeg: between(-360, 360),
    combustionDurationDeg: between(1e-6, 720),
    wiebeA: between(0.01, 100).default(6.9),
    wiebeM: upTo(20),
    intakeClosesDeg: z.number().negative().min(-360),
    exhaustOpensDeg: positiveUpTo(360),
    blowdownDeg: between(1e-6, 3600).default(14),
  }),
])

export const shapeSchema = z
  .object({
    pinDiaMm: length,
    pinBoreMm: anyLength,
    pinLengthMm: length,
    mainDiaMm: length,
    mainBoreMm: anyLength,
    mainLengthMm: length,
    webThicknessMm: length,
    webWidthMm: length,
    counterweightRadiusMm: anyLength,
    compressionHeightMm: length,
    skirtBelowPinMm: anyLength,
    /** Of the block over the crank axis, along every cylinder. */
    deckHeightMm: length,
    builtUp: z.boolean(),
  })
  .partial()

/** An unusual value that somebody stands by, and why. It holds for this very value; another is asked about again. */
export const acknowledgedSchema = z.object({
  code: z.string().min(1).max(40),
  path: z.string().max(200),
  value: z.number().optional(),
  reason: z.string().trim().min(1).max(300),
  /** When, ISO 8601. */
  at: z.string().max(40).optional(),
})

export const crankTrainSchema = z.object({
  format: z.literal('crank-train/1'),
  title: z.string().max(200).default('Untitled'),
  cycle: z.enum(['four-stroke', 'two-stroke']),
  rotation: z.enum(['clockwise', 'counterclockwise']).default('clockwise'),
  operating: z.object({ idleRpm: speed, ratedRpm: speed, maxRpm: speed }).partial().optional(),
  cylinderDefaults: z
    .object({ ...cylinderFields, offsetMm: offset.default(0) })
    .partial()
    .default({}),
  masses: z
    .object({
      ...massFields,
      pistonPinKg: anyMass.default(0),
      ringsKg: anyMass.default(0),
      locksKg: anyMass.default(0),
      bigEndBearingKg: anyMass.default(0),
      oilAllowanceKg: anyMass.default(0),
    })
    .partial({ pistonKg: true, rod: true })
    .prefault({}),
  balanceFactor: between(0, 1).default(0),
  banks: listOf(z.object({ id, angleDeg: angle })).min(1),
  throws: listOf(z.object({ id, angleDeg: angle, axialMm: place, unbalanceKgMm: unbalance.default(0) })).min(
    1,
  ),
  cylinders: z.array(cylinderSchema).min(1).max(most.cylinders),
  counterweights: listOf(
    z.object({ id, axialMm: place, angleDeg: angle, massKg: anyMass, radiusMm: anyLength }),
  ).default([]),
  balanceShafts: listOf(
    z.object({
      id,
      speedRatio: z.literal([-2, -1, 1, 2]),
      angleDeg: angle,
      unbalanceKgMm: upTo(1e9),
      axialMm: place,
      horizontalMm: place,
      verticalMm: place,
    }),
  ).default([]),
  mains: listOf(z.object({ id, axialMm: place })).default([]),
  firingOrder: listOf(id),
  collectors: listOf(z.object({ id, cylinders: listOf(id).min(1) })).default([]),
  gas: gasSchema.default({ model: 'none' }),
  crankcasePressureBar: pressure.default(1.01325),
  crankMassKg: mass.optional(),
  inertia: z
    .object({ flywheelKgM2: upTo(1e9), freeEndKgM2: upTo(1e9) })
    .partial()
    .optional(),
  shape: shapeSchema.optional(),
  referenceAxialMm: place.optional(),
  /** Whose usual ranges it is held against; guessed where not set. */
  engineClass: z.enum([...engineClassNames, 'none']).optional(),
  acknowledged: listOf(acknowledgedSchema).optional(),
})

/** A document with every default filled in. */
export type CrankTrain = z.output<typeof crankTrainSchema>
/** A document as it may arrive. */
export type CrankTrainInput = z.input<typeof crankTrainSchema>
