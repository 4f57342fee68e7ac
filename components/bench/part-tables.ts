import { formatNumber } from '@/lib/units/format'
import type { Quantity } from '@/lib/units/quantities'
import type { UnitName } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Scene } from '@/scene/model/scene'
import type { QuantityField } from '@/scene/session/field'
import type { Change, ScenePath } from '@/scene/session/path'
import {
  addBalanceShaft,
  addBank,
  addCollector,
  addCounterweight,
  addCylinder,
  addThrow,
  removeCylinder,
  rename,
} from '@/scene/session/structure'
import { plainField } from '@/scene/session/plain-field'
import { angleSlip } from '@/scene/session/usual'

type ListName = 'banks' | 'throws' | 'cylinders' | 'counterweights' | 'balanceShafts' | 'collectors'
type Events = { id: string; at: number }[]

export type Column = { key: string; label: string } & (
  | { is: 'name'; rename(train: CrankTrain, from: string, to: string): CrankTrain }
  | {
      is: 'figure'
      field(index: number): QuantityField
      /** What holds where the field is left empty. */
      otherwise?(id: string, events: Events): string
    }
  | {
      is: 'choice'
      options(scene: Scene, index: number): string[]
      get(scene: Scene, index: number): string
      changes(value: string, scene: Scene, index: number): Change[]
    }
  | {
      is: 'names'
      get(scene: Scene, index: number): string
      changes(names: string[], index: number): Change[]
    }
)

/** A list of the document as rows one can write in, add to and take from. */
export interface TableSpec {
  key: string
  label: string
  list: ListName
  columns: Column[]
  add?: { label: string; change(train: CrankTrain, events: Events): CrankTrain }
  /** Why a row has to stay, or null. */
  held?(train: CrankTrain, index: number): string | null
  remove?(train: CrankTrain, index: number): CrankTrain
}

const figure = (
  list: ListName,
  key: string,
  label: string,
  quantity: Quantity,
  unit: UnitName,
  more: { optional?: boolean; at?: (string | number)[] } = {},
): Column => ({
  is: 'figure',
  key,
  label,
  field: (index) =>
    plainField([list, index, ...(more.at ?? [key])], label, quantity, unit, {
      optional: more.optional,
      ...(quantity === 'angle' && key !== 'firesAtDeg' && { doubt: angleSlip }),
    }),
})

const name = (list: 'banks' | 'throws' | 'cylinders'): Column => ({
  is: 'name',
  key: 'id',
  label: 'Name',
  rename: (train, from, to) => rename(train, list, from, to),
})
const ownName = (list: 'counterweights' | 'balanceShafts' | 'collectors'): Column => ({
  is: 'name',
  key: 'id',
  label: 'Name',
  rename: (train, from, to) => ({
    ...train,
    [list]: train[list].map((item) => (item.id === from ? { ...item, id: to } : item)),
  }),
})

const pick = (key: 'bank' | 'throw', label: string, list: 'banks' | 'throws'): Column => ({
  is: 'choice',
  key,
  label,
  options: ({ train }) => train[list].map(({ id }) => id),
  get: ({ train }, index) => train.cylinders[index][key],
  changes: (value, _scene, index) => [{ path: ['train', 'cylinders', index, key], value }],
})

/** One of its top dead centres; the one that makes the firing most even where it is not stated. */
const firesAt: Column = {
  ...figure('cylinders', 'firesAtDeg', 'Fires at', 'angle', '°', { optional: true }),
  otherwise: (id: string, events: Events) => {
    const event = events.find((one) => one.id === id)
    return event ? `${formatNumber(event.at, { decimals: 1 })} taken` : ''
  },
} as Column

const NO_MASTER = '–'
const master: Column = {
  is: 'choice',
  key: 'link',
  label: 'Link rod on',
  options: ({ train }, index) => [
    NO_MASTER,
    ...train.cylinders.filter((cylinder, i) => i !== index && !cylinder.link).map(({ id }) => id),
  ],
  get: ({ train }, index) => train.cylinders[index].link?.master ?? NO_MASTER,
  changes(value, { train }, index) {
    const cylinder = train.cylinders[index]
    const on = train.cylinders.find(({ id }) => id === value)
    const place: ScenePath = ['train', 'cylinders', index]
    if (!on)
      return [
        { path: [...place, 'link'], value: undefined },
        { path: [...place, 'rodLengthMm'], value: undefined },
      ]
    const rod = train.cylinderDefaults.rodLengthMm ?? on.rodLengthMm ?? 100
    const turned = (id: string) => train.banks.find((bank) => bank.id === id)?.angleDeg ?? 0
    const knuckleRadiusMm = Number((0.26 * rod).toFixed(1))
    const link = { master: value, knuckleRadiusMm, knuckleAngleDeg: turned(cylinder.bank) - turned(on.bank) }
    return [
      { path: [...place, 'link'], value: link },
      { path: [...place, 'throw'], value: on.throw },
      { path: [...place, 'rodLengthMm'], value: Number((rod - knuckleRadiusMm).toFixed(1)) },
    ]
  },
}

const without =
  (list: ListName) =>
  (train: CrankTrain, index: number): CrankTrain => ({
    ...train,
    [list]: (train[list] as unknown[]).filter((_, i) => i !== index),
  })

const inUse = (key: 'bank' | 'throw', list: 'banks' | 'throws') => (train: CrankTrain, index: number) => {
  const id = train[list][index].id
  const users = train.cylinders.filter((cylinder) => cylinder[key] === id).map((cylinder) => cylinder.id)
  return users.length > 0 ? `held: cylinder ${users.join(', ')} stands on it` : null
}

export const tables = {
  banks: {
    key: 'table.banks',
    label: 'Banks',
    list: 'banks',
    columns: [name('banks'), figure('banks', 'angleDeg', 'Angle', 'angle', '°')],
    add: { label: 'Add a bank', change: addBank },
    held: inUse('bank', 'banks'),
    remove: without('banks'),
  },
  throws: {
    key: 'table.throws',
    label: 'Throw by throw',
    list: 'throws',
    columns: [
      name('throws'),
      figure('throws', 'angleDeg', 'Angle', 'angle', '°'),
      figure('throws', 'axialMm', 'Along', 'length', 'mm'),
      figure('throws', 'unbalanceKgMm', 'Unbalance', 'unbalance', 'kg mm'),
    ],
    add: { label: 'Add a throw', change: addThrow },
    held: inUse('throw', 'throws'),
    remove: without('throws'),
  },
  cylinders: {
    key: 'table.cylinders',
    label: 'Cylinder by cylinder',
    list: 'cylinders',
    columns: [
      name('cylinders'),
      pick('bank', 'Bank', 'banks'),
      pick('throw', 'Throw', 'throws'),
      figure('cylinders', 'axialMm', 'Along', 'length', 'mm'),
      firesAt,
      master,
      figure('cylinders', 'knuckleRadius', 'Knuckle at', 'length', 'mm', { at: ['link', 'knuckleRadiusMm'] }),
      figure('cylinders', 'knuckleAngle', 'Knuckle angle', 'angle', '°', { at: ['link', 'knuckleAngleDeg'] }),
    ],
    add: { label: 'Add a cylinder', change: addCylinder },
    held: (train, index) => {
      if (train.cylinders.length === 1) return 'held: the only cylinder'
      const id = train.cylinders[index].id
      const links = train.cylinders.filter((cylinder) => cylinder.link?.master === id)
      return links.length > 0
        ? `held: link rods of ${links.map((link) => link.id).join(', ')} are on it`
        : null
    },
    remove: (train, index) => removeCylinder(train, train.cylinders[index].id),
  },
  counterweights: {
    key: 'table.counterweights',
    label: 'Counterweights',
    list: 'counterweights',
    columns: [
      ownName('counterweights'),
      figure('counterweights', 'axialMm', 'Along', 'length', 'mm'),
      figure('counterweights', 'angleDeg', 'Angle', 'angle', '°'),
      figure('counterweights', 'massKg', 'Mass', 'mass', 'kg'),
      figure('counterweights', 'radiusMm', 'Radius of c.g.', 'length', 'mm'),
    ],
    add: { label: 'Add a counterweight', change: addCounterweight },
    remove: without('counterweights'),
  },
  balanceShafts: {
    key: 'table.balanceShafts',
    label: 'Balance shafts',
    list: 'balanceShafts',
    columns: [
      ownName('balanceShafts'),
      {
        is: 'choice',
        key: 'speedRatio',
        label: 'Turns',
        options: () => ['−2', '−1', '1', '2'],
        get: ({ train }, index) => String(train.balanceShafts[index].speedRatio).replace('-', '−'),
        changes: (value, _scene, index) => [
          { path: ['train', 'balanceShafts', index, 'speedRatio'], value: Number(value.replace('−', '-')) },
        ],
      },
      figure('balanceShafts', 'angleDeg', 'Angle at 0°', 'angle', '°'),
      figure('balanceShafts', 'unbalanceKgMm', 'Unbalance', 'unbalance', 'kg mm'),
      figure('balanceShafts', 'axialMm', 'Along', 'length', 'mm'),
      figure('balanceShafts', 'horizontalMm', 'Sideways', 'length', 'mm'),
      figure('balanceShafts', 'verticalMm', 'Up', 'length', 'mm'),
    ],
    add: { label: 'Add a balance shaft', change: addBalanceShaft },
    remove: without('balanceShafts'),
  },
  collectors: {
    key: 'table.collectors',
    label: 'Collectors',
    list: 'collectors',
    columns: [
      ownName('collectors'),
      {
        is: 'names',
        key: 'cylinders',
        label: 'Cylinders',
        get: ({ train }, index) => train.collectors[index].cylinders.join('-'),
        changes: (names, index) => [{ path: ['train', 'collectors', index, 'cylinders'], value: names }],
      },
    ],
    add: { label: 'Add a collector', change: addCollector },
    remove: without('collectors'),
  },
} satisfies Record<string, TableSpec>
