import type { CrankTrain } from './crank-train'

type Entry = CrankTrain['cylinders'][number]

/** Without gas forces from heat the compression ratio only sets the height of the chamber in the picture. */
const PICTURE_COMPRESSION_RATIO = 10

/** The engine-wide fields that a cylinder may state for itself. */
export const cylinderFieldNames = [
  'boreMm',
  'strokeMm',
  'rodLengthMm',
  'offsetMm',
  'compressionRatio',
] as const
export const massFieldNames = [
  'pistonKg',
  'pistonPinKg',
  'ringsKg',
  'locksKg',
  'rod',
  'bigEndBearingKg',
  'oilAllowanceKg',
] as const
export type CylinderFieldName = (typeof cylinderFieldNames)[number] | (typeof massFieldNames)[number]

/** Every value that holds for one cylinder: its own where it states one, else the common one. */
export function cylinderValues(document: CrankTrain, entry: Entry) {
  const stated = { ...document.cylinderDefaults, ...document.masses, ...defined(entry) }
  return {
    ...stated,
    boreMm: stated.boreMm as number,
    strokeMm: stated.strokeMm as number,
    rodLengthMm: stated.rodLengthMm as number,
    offsetMm: stated.offsetMm ?? 0,
    compressionRatio: stated.compressionRatio ?? PICTURE_COMPRESSION_RATIO,
    pistonKg: stated.pistonKg as number,
    rod: stated.rod as NonNullable<typeof stated.rod>,
    link: entry.link,
  }
}

/** A key that is present but undefined must not hide the common value. */
const defined = <T extends object>(entry: T): T =>
  Object.fromEntries(Object.entries(entry).filter(([, value]) => value !== undefined)) as T

/** Where the engine-wide value of a field stands in the document. */
export const commonPath = (field: CylinderFieldName): string =>
  (cylinderFieldNames as readonly string[]).includes(field) ? `cylinderDefaults.${field}` : `masses.${field}`

/** Where the value that holds for cylinder `index` stands in the document. */
export const fieldPath = (document: CrankTrain, index: number, field: CylinderFieldName): string =>
  document.cylinders[index][field] === undefined ? commonPath(field) : `cylinders.${index}.${field}`
