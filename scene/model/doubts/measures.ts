import type { Quantity } from '@/lib/units/quantities'
import type { UnitName } from '@/lib/units/units'
import type { RangeName } from '../class-ranges'
import type { CrankTrain } from '../crank-train'
import { cylinderValues, fieldPath, type CylinderFieldName } from '../cylinder-values'

export type Values = ReturnType<typeof cylinderValues>

/** One measure of an engine that a class has a usual range of. */
export interface Measure {
  code: string
  range: RangeName
  /** "Rod to stroke". */
  name: string
  /** Said after the range. */
  hint?: string
  quantity: Quantity
  unit: UnitName
  /** The measured value, or undefined where something is missing. */
  of(document: CrankTrain, values: Values): number | undefined
  /** Where the document holds what would be mended. */
  path(document: CrankTrain, index: number): string
  /** What would have to stand there for the measure to be `bound`. */
  mended?(bound: number, document: CrankTrain, values: Values): number | undefined
  /** The unit of what stands there. */
  mendUnit?: UnitName
  mendQuantity?: Quantity
}

const own =
  (field: CylinderFieldName, more = '') =>
  (document: CrankTrain, index: number) =>
    fieldPath(document, index, field) + more
const at = (path: string) => () => path
const ratio = { quantity: 'ratio', unit: '', mendUnit: 'mm', mendQuantity: 'length' } as const
const length = { quantity: 'length', unit: 'mm' } as const
const mass = { quantity: 'mass', unit: 'kg' } as const
const speed = { quantity: 'speed', unit: 'rpm' } as const
const same = (bound: number) => bound

const pistonSpeed = (values: Values, rpm: number | undefined) =>
  rpm === undefined ? undefined : (2 * (values.strokeMm / 1000) * rpm) / 60

const over = (value: number | undefined, by: number | undefined) =>
  value === undefined || by === undefined ? undefined : value / by

/** Every measure that a class has a usual range of. The first that speaks of a path and code stands. */
export const measures: Measure[] = [
  {
    code: 'bore',
    range: 'bore',
    name: 'Bore',
    ...length,
    of: (_d, { boreMm }) => boreMm,
    path: own('boreMm'),
    mended: same,
  },
  {
    code: 'stroke',
    range: 'stroke',
    name: 'Stroke',
    ...length,
    of: (_d, { strokeMm }) => strokeMm,
    path: own('strokeMm'),
    mended: same,
  },
  {
    code: 'bore-to-stroke',
    range: 'boreToStroke',
    name: 'Bore to stroke',
    ...ratio,
    of: (_d, { boreMm, strokeMm }) => boreMm / strokeMm,
    path: own('boreMm'),
    mended: (bound, _d, { strokeMm }) => bound * strokeMm,
  },
  {
    code: 'rod-length',
    range: 'rodLength',
    name: 'Rod',
    ...length,
    of: (_d, { rodLengthMm }) => rodLengthMm,
    path: own('rodLengthMm'),
    mended: same,
  },
  {
    code: 'G03',
    range: 'rodToStroke',
    name: 'Rod to stroke',
    ...ratio,
    of: (_d, { rodLengthMm, strokeMm }) => rodLengthMm / strokeMm,
    path: own('rodLengthMm'),
    mended: (bound, _d, { strokeMm }) => bound * strokeMm,
  },
  {
    code: 'offset',
    range: 'offset',
    name: 'Offset',
    ...length,
    of: (_d, { offsetMm }) => Math.abs(offsetMm),
    path: own('offsetMm'),
    mended: (bound, _d, { offsetMm }) => Math.sign(offsetMm) * bound,
  },
  {
    code: 'compression-ratio',
    range: 'compressionRatio',
    name: 'Compression ratio',
    quantity: 'ratio',
    unit: '',
    of: (_d, { compressionRatio }) => compressionRatio,
    path: own('compressionRatio'),
    mended: same,
  },
  {
    code: 'M02',
    range: 'piston',
    name: 'Piston',
    ...mass,
    of: (_d, { pistonKg }) => pistonKg,
    path: own('pistonKg'),
    mended: same,
  },
  {
    code: 'pin-rings-locks',
    range: 'pinRingsLocks',
    name: 'Piston pin, rings and locks',
    ...mass,
    of: (_d, { pistonPinKg, ringsKg, locksKg }) => pistonPinKg + ringsKg + locksKg,
    path: own('pistonPinKg'),
    mended: (bound, _d, { ringsKg, locksKg }) => bound - ringsKg - locksKg,
  },
  {
    code: 'rod-mass',
    range: 'rod',
    name: 'Rod',
    ...mass,
    of: (_d, { rod }) => rod.massKg,
    path: own('rod', '.massKg'),
    mended: same,
  },
  {
    code: 'M04',
    range: 'rodCentre',
    name: 'Rod c.g., share of the rod',
    ...ratio,
    of: (_d, { rod, rodLengthMm }) => rod.cgFromBigEndMm / rodLengthMm,
    path: own('rod', '.cgFromBigEndMm'),
    mended: (bound, _d, { rodLengthMm }) => bound * rodLengthMm,
  },
  {
    code: 'bearing',
    range: 'bearing',
    name: 'Big-end bearing',
    ...mass,
    of: (_d, { bigEndBearingKg }) => bigEndBearingKg,
    path: own('bigEndBearingKg'),
    mended: same,
  },
  {
    code: 'M08',
    range: 'oil',
    name: 'Oil allowance',
    ...mass,
    of: (_d, { oilAllowanceKg }) => oilAllowanceKg,
    path: own('oilAllowanceKg'),
    mended: same,
  },
  {
    code: 'pin-diameter',
    range: 'pinToBore',
    name: 'Crank pin to bore',
    ...ratio,
    of: ({ shape }, { boreMm }) => over(shape?.pinDiaMm, boreMm),
    path: at('shape.pinDiaMm'),
    mended: (bound, _d, { boreMm }) => bound * boreMm,
  },
  {
    code: 'main-diameter',
    range: 'mainToBore',
    name: 'Main to bore',
    ...ratio,
    of: ({ shape }, { boreMm }) => over(shape?.mainDiaMm, boreMm),
    path: at('shape.mainDiaMm'),
    mended: (bound, _d, { boreMm }) => bound * boreMm,
  },
  {
    code: 'main-length',
    range: 'mainLengthToDia',
    name: 'Main length to diameter',
    ...ratio,
    of: ({ shape }) => over(shape?.mainLengthMm, shape?.mainDiaMm),
    path: at('shape.mainLengthMm'),
    mended: (bound, { shape }) => bound * (shape?.mainDiaMm ?? NaN),
  },
  {
    code: 'web-thickness',
    range: 'webToBore',
    name: 'Web thickness to bore',
    ...ratio,
    of: ({ shape }, { boreMm }) => over(shape?.webThicknessMm, boreMm),
    path: at('shape.webThicknessMm'),
    mended: (bound, _d, { boreMm }) => bound * boreMm,
  },
  {
    code: 'counterweight-radius',
    range: 'counterweight',
    name: 'Counterweight radius',
    ...length,
    of: ({ shape }) => shape?.counterweightRadiusMm,
    path: at('shape.counterweightRadiusMm'),
    mended: same,
  },
  {
    code: 'compression-height',
    range: 'compressionHeight',
    name: 'Compression height',
    ...length,
    of: ({ shape }) => shape?.compressionHeightMm,
    path: at('shape.compressionHeightMm'),
    mended: same,
  },
  {
    code: 'skirt',
    range: 'skirt',
    name: 'Skirt below pin',
    ...length,
    of: ({ shape }) => shape?.skirtBelowPinMm,
    path: at('shape.skirtBelowPinMm'),
    mended: same,
  },
  {
    code: 'idle',
    range: 'idle',
    name: 'Idle',
    ...speed,
    of: ({ operating }) => operating?.idleRpm,
    path: at('operating.idleRpm'),
    mended: same,
  },
  {
    code: 'rated',
    range: 'rated',
    name: 'Rated speed',
    ...speed,
    of: ({ operating }) => operating?.ratedRpm,
    path: at('operating.ratedRpm'),
    mended: same,
  },
  {
    code: 'most',
    range: 'most',
    name: 'Greatest speed',
    ...speed,
    of: ({ operating }) => operating?.maxRpm,
    path: at('operating.maxRpm'),
    mended: same,
  },
  {
    code: 'piston-speed',
    range: 'pistonSpeedRated',
    name: 'Mean piston speed at rated',
    quantity: 'velocity',
    unit: 'm/s',
    of: ({ operating }, values) => pistonSpeed(values, operating?.ratedRpm),
    path: at('operating.ratedRpm'),
    mended: (bound, _d, { strokeMm }) => (30000 * bound) / strokeMm,
    mendUnit: 'rpm',
    mendQuantity: 'speed',
  },
  {
    code: 'R04',
    range: 'pistonSpeedMost',
    name: 'Mean piston speed at the most',
    quantity: 'velocity',
    unit: 'm/s',
    hint: 'Above it this is an over-speed study only.',
    of: ({ operating }, values) => pistonSpeed(values, operating?.maxRpm),
    path: at('operating.maxRpm'),
    mended: (bound, _d, { strokeMm }) => (30000 * bound) / strokeMm,
    mendUnit: 'rpm',
    mendQuantity: 'speed',
  },
]
