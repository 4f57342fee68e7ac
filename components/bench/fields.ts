import type { UnitName } from '@/lib/units/units'
import type { Quantity } from '@/lib/units/quantities'
import { quantityField, type QuantityField, type QuantityFieldOptions } from '@/scene/session/field'
import { getAt, type Path } from '@/scene/session/path'
import { setThrowPitch, throwPitch } from '@/scene/session/structure'
import { percentSlip, slip, usual } from '@/scene/session/usual'

/** A field that reads and writes one number of the train. */
export function plainField(
  path: Path,
  label: string,
  quantity: Quantity,
  documentUnit: UnitName,
  more: Partial<QuantityFieldOptions> = {},
): QuantityField {
  const full: Path = ['train', ...path]
  return quantityField({
    key: path.join('.'),
    label,
    quantity,
    documentUnit,
    get: (scene) => getAt(scene, full) as number | undefined,
    changes: (value) => [{ path: full, value }],
    ...more,
  })
}

const length = (path: Path, label: string, more?: Partial<QuantityFieldOptions>) =>
  plainField(path, label, 'length', 'mm', more)
const mass = (path: Path, label: string, more?: Partial<QuantityFieldOptions>) =>
  plainField(path, label, 'mass', 'kg', more)
const optional = { optional: true }
const lengthFar = { below: 3, above: 4 }
const massFar = { below: 12, above: 40 }
const masses: UnitName[] = ['kg', 'oz', 'lb', 'g']
const lengths: UnitName[] = ['in', 'mm', 'cm']

export const fields = {
  bankAngle: quantityField({
    key: 'bankAngle',
    label: 'Bank angle',
    quantity: 'angle',
    documentUnit: '°',
    get: ({ train }) =>
      train.banks.length === 2 ? train.banks[1].angleDeg - train.banks[0].angleDeg : undefined,
    changes: (value, { train }) => {
      const middle = (train.banks[0].angleDeg + train.banks[1].angleDeg) / 2
      return [
        { path: ['train', 'banks', 0, 'angleDeg'], value: middle - value! / 2 },
        { path: ['train', 'banks', 1, 'angleDeg'], value: middle + value! / 2 },
      ]
    },
  }),
  throwPitch: quantityField({
    key: 'throwPitch',
    label: 'Throw pitch',
    quantity: 'length',
    documentUnit: 'mm',
    get: ({ train }) => throwPitch(train),
    changes: (value, { train }) => [{ path: ['train'], value: setThrowPitch(train, value!) }],
  }),
  bore: length(['cylinderDefaults', 'boreMm'], 'Bore', {
    key: 'boreMm',
    doubt: slip(usual.bore, 'mm', lengths, lengthFar),
  }),
  stroke: length(['cylinderDefaults', 'strokeMm'], 'Stroke', {
    key: 'strokeMm',
    doubt: slip(usual.stroke, 'mm', lengths, lengthFar),
  }),
  rodLength: length(['cylinderDefaults', 'rodLengthMm'], 'Rod, centres', {
    key: 'rodLengthMm',
    doubt: (value, scene, typed) =>
      // A rod that is merely short is refused by its own rule, with its own words.
      value > 0.5 * (scene.train.cylinderDefaults.strokeMm ?? 0) || typed.number < 12
        ? slip(usual.rodLength, 'mm', lengths, lengthFar)(value, scene, typed)
        : null,
  }),
  offset: length(['cylinderDefaults', 'offsetMm'], 'Offset', { key: 'offsetMm' }),
  compressionRatio: plainField(
    ['cylinderDefaults', 'compressionRatio'],
    'Compression ratio',
    'ratio',
    '',
    optional,
  ),
  piston: mass(['masses', 'pistonKg'], 'Piston, bare', { doubt: slip(usual.piston, 'kg', masses, massFar) }),
  pistonPin: mass(['masses', 'pistonPinKg'], 'Piston pin', {
    doubt: slip(usual.pistonPin, 'kg', masses, massFar),
  }),
  rings: mass(['masses', 'ringsKg'], 'Rings'),
  locks: mass(['masses', 'locksKg'], 'Pin locks'),
  rod: mass(['masses', 'rod', 'massKg'], 'Rod', { doubt: slip(usual.rod, 'kg', masses, massFar) }),
  rodCentre: length(['masses', 'rod', 'cgFromBigEndMm'], 'Rod c.g. from big end'),
  rodInertia: plainField(['masses', 'rod', 'inertiaKgMm2'], 'Rod inertia', 'inertia', 'kg mm²', optional),
  bearing: mass(['masses', 'bigEndBearingKg'], 'Big-end bearing'),
  oil: mass(['masses', 'oilAllowanceKg'], 'Oil allowance', {
    doubt: slip(usual.oil, 'kg', ['oz', 'g'], { below: 100, above: 6 }),
  }),
  pinDia: length(['shape', 'pinDiaMm'], 'Crank pin diameter', { key: 'pinDiaMm', optional: true }),
  pinLength: length(['shape', 'pinLengthMm'], 'Crank pin length', optional),
  pinBore: length(['shape', 'pinBoreMm'], 'Crank pin bore', optional),
  mainDia: length(['shape', 'mainDiaMm'], 'Main diameter', optional),
  mainLength: length(['shape', 'mainLengthMm'], 'Main length', optional),
  mainBore: length(['shape', 'mainBoreMm'], 'Main bore', optional),
  webThickness: length(['shape', 'webThicknessMm'], 'Web thickness', optional),
  webWidth: length(['shape', 'webWidthMm'], 'Web width', optional),
  counterweightRadius: length(['shape', 'counterweightRadiusMm'], 'Counterweight radius', optional),
  compressionHeight: length(['shape', 'compressionHeightMm'], 'Compression height', optional),
  skirt: length(['shape', 'skirtBelowPinMm'], 'Skirt below pin', optional),
  crankMass: mass(['crankMassKg'], 'Crank mass', optional),
  flywheel: plainField(['inertia', 'flywheelKgM2'], 'Flywheel inertia', 'inertia', 'kg m²', optional),
  freeEnd: plainField(['inertia', 'freeEndKgM2'], 'Free-end inertia', 'inertia', 'kg m²', optional),
  balanceFactor: plainField(['balanceFactor'], 'Balance factor', 'share', '', { doubt: percentSlip }),
  reference: length(['referenceAxialMm'], 'Couples about', optional),
  idle: plainField(['operating', 'idleRpm'], 'Idle', 'speed', 'rpm', { key: 'idleRpm', optional: true }),
  rated: plainField(['operating', 'ratedRpm'], 'Rated', 'speed', 'rpm', optional),
  most: plainField(['operating', 'maxRpm'], 'Most', 'speed', 'rpm', { key: 'maxRpm', optional: true }),
  crankcase: plainField(['crankcasePressureBar'], 'Crankcase pressure', 'pressure', 'bar'),
  intake: plainField(['gas', 'intakePressureBar'], 'Intake pressure', 'pressure', 'bar'),
  exhaust: plainField(['gas', 'exhaustPressureBar'], 'Exhaust pressure', 'pressure', 'bar'),
  gamma: plainField(['gas', 'gamma'], 'Ratio of specific heats', 'ratio', ''),
  heat: plainField(['gas', 'heatPerCycleJ'], 'Heat a cycle', 'energy', 'J'),
  burnStart: plainField(['gas', 'combustionStartDeg'], 'Burning starts', 'angle', '°'),
  burnFor: plainField(['gas', 'combustionDurationDeg'], 'Burns for', 'angle', '°'),
  wiebeA: plainField(['gas', 'wiebeA'], 'Wiebe a', 'ratio', ''),
  wiebeM: plainField(['gas', 'wiebeM'], 'Wiebe m', 'ratio', ''),
  intakeCloses: plainField(['gas', 'intakeClosesDeg'], 'Intake closes', 'angle', '°'),
  exhaustOpens: plainField(['gas', 'exhaustOpensDeg'], 'Exhaust opens', 'angle', '°'),
  blowdown: plainField(['gas', 'blowdownDeg'], 'Blowdown falls over', 'angle', '°'),
  speed: quantityField({
    key: 'speedRpm',
    label: 'Engine speed',
    quantity: 'speed',
    documentUnit: 'rpm',
    get: ({ view }) => view.speedRpm,
    changes: (value) => [{ path: ['view', 'speedRpm'], value }],
    refuse: (value) => (value < 0 ? 'A speed is 0 or more; “Reverse” turns the crank the other way.' : null),
    doubt: (value, { train }, typed) => {
      const stroke = train.cylinderDefaults.strokeMm ?? train.cylinders[0].strokeMm ?? 0
      const piston = (2 * stroke * value) / 60000
      if (piston <= 45) return null
      const fewer = String(Math.round(typed.number / 10))
      return {
        head: 'Extra zero?',
        message: `${Math.round(value).toLocaleString('en')} rpm is a mean piston speed of ${piston.toFixed(0)} m/s; usual is up to 27.`,
        mends: [{ label: `Use ${fewer} rpm`, text: `${fewer} rpm` }],
        keep: 'Keep it',
      }
    },
  }),
} satisfies Record<string, QuantityField>
