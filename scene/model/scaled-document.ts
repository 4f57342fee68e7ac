import type { CrankTrain } from './crank-train'

type Cylinder = CrankTrain['cylinders'][number]
type Rod = NonNullable<CrankTrain['masses']['rod']>

/**
 * A geometrically similar engine: every length times `factor`, of the same materials.
 *
 * Lengths × f, masses × f³ (same density), mass × length × f⁴, mass moments of inertia × f⁵, heat a cycle × f³ (the same
 * pressures in f³ of the volume). Angles, ratios, pressures, phasing, order and speeds stay. So at equal speed inertia
 * forces grow as f⁴ and gas forces as f²; at equal mean piston speed both grow as f². f > 0. Source: rules of
 * similarity, common practice.
 */
export function scaledDocument(document: CrankTrain, factor: number): CrankTrain {
  if (!(factor > 0) || !Number.isFinite(factor))
    throw new RangeError(`A scale must be a number above 0, not ${factor}.`)
  if (factor === 1) return document
  const power = (exponent: number) => (value: number) => value * factor ** exponent
  const [length, mass, moment, inertia] = [power(1), power(3), power(4), power(5)]
  const lengths = <T extends object>(of: T) =>
    each(of, ['boreMm', 'strokeMm', 'rodLengthMm', 'offsetMm'], length)
  const rod = (of: Rod): Rod => ({
    massKg: mass(of.massKg),
    cgFromBigEndMm: length(of.cgFromBigEndMm),
    ...(of.inertiaKgMm2 !== undefined && { inertiaKgMm2: inertia(of.inertiaKgMm2) }),
  })
  const masses = <T extends { rod?: Rod }>(of: T): T => ({
    ...each(of, weighed, mass),
    ...(of.rod && { rod: rod(of.rod) }),
  })
  const place = <T extends object>(of: T) => each(of, ['axialMm'], length)
  const { shape, gas, inertia: ends } = document
  return {
    ...each(each(document, ['referenceAxialMm'], length), ['crankMassKg'], mass),
    cylinderDefaults: lengths(document.cylinderDefaults),
    masses: masses(document.masses),
    throws: document.throws.map((pin) => each(place(pin), ['unbalanceKgMm'], moment)),
    cylinders: document.cylinders.map((cylinder) => scaledCylinder(place(masses(lengths(cylinder))), length)),
    counterweights: document.counterweights.map((weight) =>
      each(each(place(weight), ['radiusMm'], length), ['massKg'], mass),
    ),
    balanceShafts: document.balanceShafts.map((shaft) =>
      each(each(place(shaft), ['horizontalMm', 'verticalMm'], length), ['unbalanceKgMm'], moment),
    ),
    mains: document.mains.map(place),
    gas: gas.model === 'heat-release' ? each(gas, ['heatPerCycleJ'], mass) : gas,
    ...(ends && { inertia: each(ends, ['flywheelKgM2', 'freeEndKgM2'], inertia) }),
    ...(shape && { shape: each(shape, sizes, length) }),
  }
}

/** The factor that brings a displacement to another: lengths by the cube root of the volumes' ratio. */
export const similarityFactor = (fromVolume: number, toVolume: number): number =>
  Math.cbrt(toVolume / fromVolume)

const weighed = ['pistonKg', 'pistonPinKg', 'ringsKg', 'locksKg', 'bigEndBearingKg', 'oilAllowanceKg']
const sizes = [
  ...['pinDiaMm', 'pinBoreMm', 'pinLengthMm', 'mainDiaMm', 'mainBoreMm', 'mainLengthMm', 'webThicknessMm'],
  ...['webWidthMm', 'counterweightRadiusMm', 'compressionHeightMm', 'skirtBelowPinMm'],
]

const scaledCylinder = (cylinder: Cylinder, length: (value: number) => number): Cylinder =>
  cylinder.link ? { ...cylinder, link: each(cylinder.link, ['knuckleRadiusMm'], length) } : cylinder

/** The same object with these of its numbers changed; what is not there stays away. */
const each = <T extends object>(of: T, names: readonly string[], change: (value: number) => number): T =>
  Object.fromEntries(
    Object.entries(of).map(([name, value]) => [
      name,
      names.includes(name) && typeof value === 'number' ? change(value) : value,
    ]),
  ) as T
