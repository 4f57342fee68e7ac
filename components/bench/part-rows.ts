import type { PartKind } from '@/scene/frame/types'
import type { CrankTrain } from '@/scene/model/crank-train'
import { engineClasses, engineClassNames } from '@/scene/model/class-ranges'
import { guessedClass } from '@/scene/model/engine-class'
import type { Scene } from '@/scene/model/scene'
import { usualHeatRelease } from '@/scene/model/usual-heat-release'
import type { QuantityField } from '@/scene/session/field'
import type { Locks } from '@/scene/session/locks'
import type { Change } from '@/scene/session/path'
import { fields } from './fields'
import { tables, type TableSpec } from './part-tables'
import { bankAngles, firingOrder, mainPlaces, throwAngles, type TextField } from './text-fields'

export interface ChoiceSpec {
  key: string
  label: string
  options: { value: string; label: string }[] | ((scene: Scene) => { value: string; label: string }[])
  get(scene: Scene): string
  changes(value: string, scene: Scene): Change[]
}

/** One line of the parts list. `kinds` are the parts of the drawing it is about; `balloon` puts its number on them. */
type RowSpec = { kinds?: PartKind[]; balloon?: boolean; when?(scene: Scene): boolean } & (
  | { is: 'figure'; field: QuantityField }
  | { is: 'text'; field: TextField; unit?: string }
  | { is: 'choice'; choice: ChoiceSpec }
  | { is: 'table'; table: TableSpec }
  | { is: 'trace' }
  | { is: 'unequal' }
  | { is: 'lock'; lock: keyof Locks }
)

interface RowGroup {
  name: string
  rows: RowSpec[]
}

const figure = (field: QuantityField, ...kinds: PartKind[]): RowSpec => ({ is: 'figure', field, kinds })
const ballooned = (field: QuantityField, kind: PartKind): RowSpec => ({
  ...figure(field, kind),
  balloon: true,
})
const when = (row: RowSpec, holds: (scene: Scene) => boolean): RowSpec => ({ ...row, when: holds })

const choice = <K extends 'cycle' | 'rotation'>(
  key: K,
  label: string,
  options: { value: CrankTrain[K]; label: string }[],
): RowSpec => ({
  is: 'choice',
  choice: {
    key,
    label,
    options,
    get: ({ train }) => train[key],
    changes: (value) => [{ path: ['train', key], value }],
  },
})

/** The gas model begins with sane figures: usual heat, a flat trace at one bar. */
function gasOf(model: string, { train }: Scene): CrankTrain['gas'] {
  const half = train.cycle === 'two-stroke' ? 180 : 360
  if (model === 'heat-release') return usualHeatRelease(train)
  if (model === 'trace') {
    const angleDeg = Array.from({ length: (2 * half) / 10 }, (_, i) => i * 10 - half)
    return { model: 'trace', angleDeg, pressureBar: angleDeg.map(() => 1) }
  }
  return { model: 'none' }
}

const gasModel: RowSpec = {
  is: 'choice',
  choice: {
    key: 'gas.model',
    label: 'Gas model',
    options: [
      { value: 'none', label: 'no gas force' },
      { value: 'heat-release', label: 'heat release' },
      { value: 'trace', label: 'pressure trace' },
    ],
    get: ({ train }) => train.gas.model,
    changes: (value, scene) => [{ path: ['train', 'gas'], value: gasOf(value, scene) }],
  },
}
/** Whose usual ranges the values are held against: looked up by the layout until somebody says otherwise. */
const engineClass: RowSpec = {
  is: 'choice',
  choice: {
    key: 'engineClass',
    label: 'Held against',
    options: ({ train }) => {
      const guess = guessedClass(train)
      return [
        { value: '', label: `${guess ? engineClasses[guess] : 'no class'}, guessed` },
        ...engineClassNames.map((value) => ({ value, label: engineClasses[value] })),
        { value: 'none', label: 'no class' },
      ]
    },
    get: ({ train }) => train.engineClass ?? '',
    changes: (value) => [{ path: ['train', 'engineClass'], value: value || undefined }],
  },
}
const ifHeat = (field: QuantityField) =>
  when(figure(field), ({ train }) => train.gas.model === 'heat-release')

const groups: RowGroup[] = [
  {
    name: 'Layout',
    rows: [
      when(figure(fields.bankAngle), ({ train }) => train.banks.length === 2),
      when({ is: 'text', field: bankAngles, unit: '°' }, ({ train }) => train.banks.length !== 2),
      { is: 'text', field: throwAngles, unit: '°', kinds: ['crank-pin'] },
      when(figure(fields.throwPitch), ({ train }) => train.throws.length > 1),
      { is: 'text', field: firingOrder },
      { is: 'table', table: tables.banks },
      { is: 'table', table: tables.throws },
      { is: 'table', table: tables.cylinders },
      engineClass,
      choice('rotation', 'Turns, from free end', [
        { value: 'clockwise', label: 'clockwise' },
        { value: 'counterclockwise', label: 'counter-clockwise' },
      ]),
    ],
  },
  {
    name: 'Cylinder',
    rows: [
      ballooned(fields.bore, 'liner'),
      ballooned(fields.stroke, 'web'),
      ballooned(fields.rodLength, 'rod'),
      { is: 'lock', lock: 'displacement' },
      figure(fields.offset),
      figure(fields.compressionRatio),
    ],
  },
  {
    name: 'Masses',
    rows: [
      ballooned(fields.piston, 'piston'),
      ballooned(fields.pistonPin, 'piston-pin'),
      figure(fields.rings, 'ring'),
      figure(fields.locks),
      figure(fields.rod, 'rod-cap'),
      figure(fields.rodCentre),
      figure(fields.rodInertia),
      figure(fields.bearing),
      figure(fields.oil),
      { is: 'unequal' },
    ],
  },
  {
    name: 'Crank',
    rows: [
      ballooned(fields.pinDia, 'crank-pin'),
      figure(fields.pinLength),
      figure(fields.pinBore),
      ballooned(fields.mainDia, 'main-journal'),
      figure(fields.mainLength),
      figure(fields.mainBore),
      figure(fields.webThickness),
      figure(fields.webWidth),
      ballooned(fields.counterweightRadius, 'counterweight'),
      figure(fields.compressionHeight),
      { is: 'lock', lock: 'deck' },
      figure(fields.deckHeight),
      figure(fields.skirt),
      figure(fields.crankMass),
      ballooned(fields.flywheel, 'flywheel'),
      figure(fields.freeEnd, 'free-end'),
      {
        is: 'choice',
        choice: {
          key: 'shape.builtUp',
          label: 'Crank is',
          options: [
            { value: 'false', label: 'one piece' },
            { value: 'true', label: 'built up' },
          ],
          get: ({ train }) => String(train.shape?.builtUp ?? false),
          changes: (value) => [{ path: ['train', 'shape', 'builtUp'], value: value === 'true' }],
        },
      },
    ],
  },
  {
    name: 'Balance and mains',
    rows: [
      figure(fields.balanceFactor),
      { is: 'table', table: tables.counterweights },
      { is: 'table', table: tables.balanceShafts },
      { is: 'text', field: mainPlaces, unit: 'mm', kinds: ['main-bearing'] },
      figure(fields.reference),
    ],
  },
  {
    name: 'Firing',
    rows: [
      choice('cycle', 'Cycle', [
        { value: 'four-stroke', label: 'four-stroke' },
        { value: 'two-stroke', label: 'two-stroke' },
      ]),
      figure(fields.idle),
      figure(fields.rated),
      figure(fields.most),
    ],
  },
  {
    name: 'Gas',
    rows: [
      gasModel,
      ifHeat(fields.intake),
      ifHeat(fields.exhaust),
      ifHeat(fields.gamma),
      ifHeat(fields.heat),
      ifHeat(fields.burnStart),
      ifHeat(fields.burnFor),
      ifHeat(fields.wiebeA),
      ifHeat(fields.wiebeM),
      ifHeat(fields.intakeCloses),
      ifHeat(fields.exhaustOpens),
      ifHeat(fields.blowdown),
      when({ is: 'trace' }, ({ train }) => train.gas.model === 'trace'),
      figure(fields.crankcase),
    ],
  },
  { name: 'Collectors', rows: [{ is: 'table', table: tables.collectors }] },
]

/** The key that tells a row from every other. */
export const rowKey = (row: RowSpec): string =>
  row.is === 'choice'
    ? row.choice.key
    : row.is === 'table'
      ? row.table.key
      : row.is === 'trace'
        ? 'gas.trace'
        : row.is === 'unequal'
          ? 'table.unequal'
          : row.is === 'lock'
            ? `lock.${row.lock}`
            : row.field.key

export interface NumberedRow {
  row: RowSpec
  number: number
}

/** The rows that this scene has, numbered through. */
export function numberedRows(scene: Scene): { name: string; rows: NumberedRow[] }[] {
  let number = 0
  return groups.map(({ name, rows }) => ({
    name,
    rows: rows.filter((row) => row.when?.(scene) ?? true).map((row) => ({ row, number: ++number })),
  }))
}
