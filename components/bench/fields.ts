import type { UnitName } from '@/lib/units/units'
import { quantityField, type QuantityField, type QuantityFieldOptions } from '@/scene/session/field'
import { deckHeightField } from '@/scene/session/clearance-fields'
import { crankcaseField, heatReleaseFields } from '@/scene/session/gas-fields'
import type { Path } from '@/scene/session/path'
import { plainField } from '@/scene/session/plain-field'
import { setThrowPitch, throwPitch } from '@/scene/session/structure'
import { angleSlip, centreSlip, notNegative, factorSlip, slip, speedSlip, usual } from '@/scene/session/usual'

const length = (path: Path, label: string, more?: Partial<QuantityFieldOptions>) =>
  plainField(path, label, 'length', 'mm', { refuse: notNegative('A length'), ...more })
const mass = (path: Path, label: string, more?: Partial<QuantityFieldOptions>) =>
  plainField(path, label, 'mass', 'kg', { refuse: notNegative('A mass'), ...more })
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
    doubt: angleSlip,
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
        ? slip(usual.rodLength, 'mm', lengths, { below: 3, above: 1.6 })(value, scene, typed)
        : null,
  }),
  offset: length(['cylinderDefaults', 'offsetMm'], 'Offset', { key: 'offsetMm', refuse: undefined }),
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
  rodCentre: length(['masses', 'rod', 'cgFromBigEndMm'], 'Rod c.g. from big end', {
    doubt: centreSlip,
  }),
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
  deckHeight: deckHeightField,
  skirt: length(['shape', 'skirtBelowPinMm'], 'Skirt below pin', optional),
  crankMass: mass(['crankMassKg'], 'Crank mass', optional),
  flywheel: plainField(['inertia', 'flywheelKgM2'], 'Flywheel inertia', 'inertia', 'kg m²', optional),
  freeEnd: plainField(['inertia', 'freeEndKgM2'], 'Free-end inertia', 'inertia', 'kg m²', optional),
  balanceFactor: plainField(['balanceFactor'], 'Balance factor', 'share', '', { doubt: factorSlip }),
  reference: length(['referenceAxialMm'], 'Couples about', { optional: true, refuse: undefined }),
  idle: plainField(['operating', 'idleRpm'], 'Idle', 'speed', 'rpm', {
    key: 'idleRpm',
    optional: true,
    doubt: speedSlip,
  }),
  rated: plainField(['operating', 'ratedRpm'], 'Rated', 'speed', 'rpm', {
    optional: true,
    doubt: speedSlip,
  }),
  most: plainField(['operating', 'maxRpm'], 'Most', 'speed', 'rpm', {
    key: 'maxRpm',
    optional: true,
    doubt: speedSlip,
  }),
  crankcase: crankcaseField,
  ...heatReleaseFields,
  speed: quantityField({
    key: 'speedRpm',
    label: 'Engine speed',
    quantity: 'speed',
    documentUnit: 'rpm',
    get: ({ view }) => view.speedRpm,
    changes: (value) => [{ path: ['view', 'speedRpm'], value }],
    refuse: (value) =>
      value < 0
        ? { message: 'A speed is 0 or more; “Reverse” turns the crank the other way.', mends: [] }
        : null,
    doubt: speedSlip,
  }),
} satisfies Record<string, QuantityField>
