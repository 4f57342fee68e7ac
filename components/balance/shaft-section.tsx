'use client'

import { useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import { SpeedWords } from '@/components/figures/speed-words'
import { TypedField } from '@/components/figures/typed-field'
import { useTyped } from '@/components/figures/use-typed'
import { DataTable } from '@/components/ui/data-table'
import { Segmented } from '@/components/ui/segmented'
import { designShafts, type ShaftWish } from '@/lib/mechanics/balance/shaft-design'
import { exactOrders, type OrderTurning } from '@/lib/mechanics/balance/turning'
import type { BalanceShaft, Train } from '@/lib/mechanics/train'
import type { FigureRow } from '@/components/figures/note'
import { formatQuantity, quantityText } from '@/lib/units/format'
import { scaleFor, type System } from '@/lib/units/quantities'
import { fromSi, toSi, units } from '@/lib/units/units'
import type { Table } from '@/lib/tables/table'
import { useBench, useResults, useSessionState } from '@/scene/session/react'

const targets = [
  { value: 'first', label: 'Backward, at crank speed', order: 1 },
  { value: 'second', label: 'At twice the speed', order: 2 },
] as const

/** Balance shafts for what counterweights cannot reach: sized, phased, tried with a wrong phase, put into the engine. */
export function ShaftSection() {
  const { session } = useBench()
  const { train, document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const [chosen, setTarget] = useState<(typeof targets)[number]['value'] | null>(null)
  const [remove, setRemove] = useState<ShaftWish['remove']>('both')
  const ends = endsOf(train)
  const first = useTyped('length', system, ends[0], () => null)
  const last = useTyped('length', system, ends[1], () => null)
  const sideways = useTyped(
    'length',
    system,
    Math.max(...train.cylinders.map(({ bore }) => bore)),
    () => null,
  )
  const up = useTyped(
    'length',
    system,
    -1.6 * Math.max(...train.cylinders.map(({ bore }) => bore)),
    () => null,
  )
  const wrong = useTyped('angle', '°', 0, () => null)

  const orders = exactOrders(train)
  const target = chosen ?? likelier(orders, train)
  const order = target === 'first' ? 1 : 2
  const [a, b] = [first.value!, last.value!]
  const apart = a !== b
  const wish: ShaftWish = {
    order,
    remove: apart ? remove : 'force',
    places: remove === 'force' ? [(a + b) / 2] : [a, b],
    horizontal: sideways.value!,
    vertical: up.value!,
  }
  const shafts = designShafts(train, wish, orders)
  const off = wrong.value ?? 0
  const turned = shafts.map((shaft) => ({ ...shaft, angle: shaft.angle + off }))
  const fitted = exactOrders({ ...train, balanceShafts: [...train.balanceShafts, ...turned] })
  const [before, after] = [orders, fitted].map((all) => all.find((each) => each.order === order)!)
  const square = toSi(speedRpm, 'rpm') ** 2
  const length = (value: number | undefined) => formatQuantity(value ?? 0, 'length', system)
  const add = () => {
    session.seal()
    session.edit([
      { path: ['train', 'balanceShafts'], value: [...document.balanceShafts, ...shafts.map(inDocument)] },
    ])
  }
  return (
    <LeafSection title="Balance shafts" at={<SpeedWords />} wide>
      <div className="balance-tools">
        <Segmented
          label="What they turn against"
          value={target}
          options={[...targets]}
          onChange={setTarget}
        />
        <Segmented
          label="Remove"
          value={wish.remove}
          options={[
            { value: 'force', label: 'Force' },
            { value: 'couple', label: 'Couple' },
            { value: 'both', label: 'Both' },
          ]}
          onChange={setRemove}
        />
      </div>
      <div className="balance-fields">
        <TypedField label="From, along the crank" typed={first} shown={length(first.value)} />
        <TypedField label="To" typed={last} shown={length(last.value)} />
        <TypedField label="Sideways" typed={sideways} shown={length(sideways.value)} />
        <TypedField label="Up" typed={up} shown={length(up.value)} />
      </div>
      {shafts.length === 0 ? (
        <p className="read">
          Nothing of this is left to remove
          {train.balanceShafts.length > 0
            ? `, with the ${train.balanceShafts.length} shaft weights fitted`
            : ''}
          .
        </p>
      ) : (
        <>
          <DataTable table={shaftTable(shafts, system)} />
          <div className="shaft-result">
            <div className="balance-fields">
              <TypedField label="Set wrong by" typed={wrong} shown={formatQuantity(off, 'angle', system)} />
            </div>
            <Figures rows={resultRows(before, after, order, square, system)} />
          </div>
          <p className="say" aria-live="polite">
            {resultWords(before, after, order, off)}
          </p>
          <div className="balance-tools">
            <button type="button" className="btn pri" onClick={add}>
              Add to the engine
            </button>
            {train.balanceShafts.length > 0 ? (
              <span className="cap">{train.balanceShafts.length} shaft weights are fitted already.</span>
            ) : null}
          </div>
        </>
      )}
    </LeafSection>
  )
}

/** What there is more of to remove. */
function likelier(orders: readonly OrderTurning[], train: Train): (typeof targets)[number]['value'] {
  const length = train.cylinders[0].bore
  const size = (order: 1 | 2) => {
    const found = orders.find((each) => each.order === order)!
    return sizeOf(found, 'force', order) + sizeOf(found, 'couple', order) / length
  }
  return size(1) >= size(2) ? 'first' : 'second'
}

/** Where shaft weights would stand: at the outermost cylinders, or half a bore to both sides of a single one. */
function endsOf({ cylinders }: Train): [number, number] {
  const places = cylinders.map(({ axial }) => axial)
  const [low, high] = [Math.min(...places), Math.max(...places)]
  return low < high ? [low, high] : [low - cylinders[0].bore / 2, low + cylinders[0].bore / 2]
}

const inDocument = (shaft: BalanceShaft) => ({
  id: shaft.id,
  speedRatio: shaft.speedRatio,
  angleDeg: (fromSi(shaft.angle, '°') + 360) % 360,
  unbalanceKgMm: fromSi(shaft.unbalance, 'kg mm'),
  axialMm: fromSi(shaft.axial, 'mm'),
  horizontalMm: fromSi(shaft.horizontal, 'mm'),
  verticalMm: fromSi(shaft.vertical, 'mm'),
})

function shaftTable(shafts: readonly BalanceShaft[], system: System): Table {
  const moment = scaleFor(0, 'unbalance', system)
  const length = scaleFor(0, 'length', system)
  const decimals = (scale: typeof moment) => ('decimals' in scale.digits ? scale.digits.decimals : 1)
  const lengths = (name: string) => ({
    name,
    unit: length.unit,
    si: { unit: 'm', factor: units[length.unit].factor },
    decimals: decimals(length),
  })
  return {
    title: 'Balance shafts to add',
    columns: [
      { name: 'Weight', unit: '' },
      { name: 'Turns', unit: '× crank', decimals: 0 },
      {
        name: 'Unbalance',
        unit: moment.unit,
        si: { unit: 'kg m', factor: units[moment.unit].factor },
        decimals: decimals(moment),
      },
      { name: 'Angle with the crank at 0', unit: '°', decimals: 1 },
      lengths('Along'),
      lengths('Sideways'),
      lengths('Up'),
    ],
    rows: shafts.map((shaft) => [
      shaft.id,
      shaft.speedRatio,
      fromSi(shaft.unbalance, moment.unit),
      (fromSi(shaft.angle, '°') + 360) % 360,
      ...[shaft.axial, shaft.horizontal, shaft.vertical].map((value) => fromSi(value, length.unit)),
    ]),
  }
}

/** What the shafts are to take, of one order: the backward part of the first, all of the second. */
const sizeOf = (turning: OrderTurning, kind: 'force' | 'couple', order: 1 | 2) =>
  order === 1 ? turning[kind].backward.size : turning[kind].major

const taken = {
  1: { force: 'order-backward', couple: 'order-couple-backward' },
  2: { force: 'order-long-axis', couple: 'order-couple-long-axis' },
} as const

function resultRows(
  before: OrderTurning,
  after: OrderTurning,
  order: 1 | 2,
  square: number,
  system: System,
): FigureRow[] {
  return (['force', 'couple'] as const).flatMap((kind) =>
    (
      [
        ['without them', before],
        ['with them', after],
      ] as const
    ).map(([words, turning]) => ({
      name: `${kind === 'force' ? 'Force' : 'Couple'} ${words}`,
      figure: formatQuantity(
        sizeOf(turning, kind, order) * square,
        kind === 'force' ? 'force' : 'torque',
        system,
      ),
      behind: turning === before ? { figure: taken[order][kind], order } : undefined,
    })),
  )
}

function resultWords(before: OrderTurning, after: OrderTurning, order: 1 | 2, off: number): string {
  const grew = (['force', 'couple'] as const).filter(
    (kind) => sizeOf(after, kind, order) > sizeOf(before, kind, order) * (1 + 1e-9) + 1e-12,
  )
  if (off === 0) return 'Set right, they take what was asked.'
  const by = quantityText(off, 'angle', 'si')
  return grew.length > 0
    ? `Set wrong by ${by} they add to the ${grew.join(' and the ')}: worse than no shafts.`
    : `Set wrong by ${by} they leave part of it.`
}
