import { z } from 'zod'

/**
 * The crank-train document, format "crank-train/1": its shape, in the units its key names state.
 * What a well-shaped document can still get wrong (a rod too short to turn, an order that cannot be) is
 * judged by `readTrain`, which is the only door into the kernel.
 */
const id = z.string().min(1).max(40)
const finite = z.number()
const positive = z.number().positive()
const notNegative = z.number().nonnegative()

export const rodSchema = z.object({
  massKg: positive,
  cgFromBigEndMm: notNegative,
  inertiaKgMm2: positive.optional(),
})

const cylinderFields = {
  boreMm: positive,
  strokeMm: positive,
  rodLengthMm: positive,
  offsetMm: finite,
  compressionRatio: z.number().gt(1),
}

const massFields = {
  pistonKg: positive,
  pistonPinKg: notNegative,
  ringsKg: notNegative,
  locksKg: notNegative,
  rod: rodSchema,
  bigEndBearingKg: notNegative,
  oilAllowanceKg: notNegative,
}

export const linkSchema = z.object({
  master: id,
  knuckleRadiusMm: positive,
  knuckleAngleDeg: finite,
})

export const cylinderSchema = z.object({
  id,
  bank: id,
  throw: id,
  axialMm: finite,
  link: linkSchema.optional(),
  firesAtDeg: notNegative.optional(),
  ...z.object({ ...cylinderFields, ...massFields }).partial().shape,
})

export const gasSchema = z.discriminatedUnion('model', [
  z.object({ model: z.literal('none') }),
  z.object({ model: z.literal('trace'), angleDeg: z.array(finite), pressureBar: z.array(notNegative) }),
  z.object({
    model: z.literal('heat-release'),
    intakePressureBar: positive,
    exhaustPressureBar: positive,
    gamma: z.number().gt(1).lt(2),
    heatPerCycleJ: notNegative,
    combustionStartDeg: finite,
    combustionDurationDeg: positive,
    wiebeA: positive.default(6.9),
    wiebeM: notNegative,
    intakeClosesDeg: z.number().negative(),
    exhaustOpensDeg: positive,
    blowdownDeg: positive.default(14),
  }),
])

export const shapeSchema = z
  .object({
    pinDiaMm: positive,
    pinBoreMm: notNegative,
    pinLengthMm: positive,
    mainDiaMm: positive,
    mainBoreMm: notNegative,
    mainLengthMm: positive,
    webThicknessMm: positive,
    webWidthMm: positive,
    counterweightRadiusMm: notNegative,
    compressionHeightMm: positive,
    skirtBelowPinMm: notNegative,
    builtUp: z.boolean(),
  })
  .partial()

export const crankTrainSchema = z.object({
  format: z.literal('crank-train/1'),
  title: z.string().max(200).default('Untitled'),
  cycle: z.enum(['four-stroke', 'two-stroke']),
  rotation: z.enum(['clockwise', 'counterclockwise']).default('clockwise'),
  operating: z.object({ idleRpm: positive, ratedRpm: positive, maxRpm: positive }).partial().optional(),
  cylinderDefaults: z.object({ ...cylinderFields, offsetMm: finite.default(0) }).partial().default({}),
  masses: z
    .object({
      ...massFields,
      pistonPinKg: notNegative.default(0),
      ringsKg: notNegative.default(0),
      locksKg: notNegative.default(0),
      bigEndBearingKg: notNegative.default(0),
      oilAllowanceKg: notNegative.default(0),
    })
    .partial({ pistonKg: true, rod: true }),
  balanceFactor: z.number().min(0).max(1).default(0),
  banks: z.array(z.object({ id, angleDeg: finite })).min(1),
  throws: z.array(z.object({ id, angleDeg: finite, axialMm: finite, unbalanceKgMm: finite.default(0) })).min(1),
  cylinders: z.array(cylinderSchema).min(1),
  counterweights: z
    .array(z.object({ id, axialMm: finite, angleDeg: finite, massKg: notNegative, radiusMm: notNegative }))
    .default([]),
  balanceShafts: z
    .array(
      z.object({
        id,
        speedRatio: z.union([z.literal(-2), z.literal(-1), z.literal(1), z.literal(2)]),
        angleDeg: finite,
        unbalanceKgMm: notNegative,
        axialMm: finite,
        horizontalMm: finite,
        verticalMm: finite,
      }),
    )
    .default([]),
  mains: z.array(z.object({ id, axialMm: finite })).default([]),
  firingOrder: z.array(id),
  collectors: z.array(z.object({ id, cylinders: z.array(id).min(1) })).default([]),
  gas: gasSchema.default({ model: 'none' }),
  crankcasePressureBar: positive.default(1.01325),
  crankMassKg: positive.optional(),
  inertia: z.object({ flywheelKgM2: notNegative, freeEndKgM2: notNegative }).partial().optional(),
  shape: shapeSchema.optional(),
  referenceAxialMm: finite.optional(),
})

/** A document with every default filled in. */
export type CrankTrain = z.output<typeof crankTrainSchema>
/** A document as it may arrive. */
export type CrankTrainInput = z.input<typeof crankTrainSchema>
