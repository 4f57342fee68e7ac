'use client'

import { useMemo, useState } from 'react'
import { behindCell } from '@/components/figures/behind-cell'
import type { FigureId } from '@/lib/mechanics/explain/explain'
import { LeafSection } from '@/components/figures/leaf'
import { SpeedWords } from '@/components/figures/speed-words'
import { DataTable } from '@/components/ui/data-table'
import { Segmented } from '@/components/ui/segmented'
import { layoutOrders, type LayoutOrders } from '@/lib/mechanics/balance/layout-orders'
import { textbookOrders } from '@/lib/mechanics/balance/textbook-orders'
import { turningOrders, type OrderTurning, type Turning } from '@/lib/mechanics/balance/turning'
import { formatNumber, quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { layoutTable, orderTable, type OrderRow } from './order-tables'

const bothKinds = ['force', 'couple'] as const

/** Orders 1, 2, 4 and 6 by the sense in which they turn: of the engine at speed, and of its layout in units of F1. */
export function OrderSection() {
  const { train, speedRpm, analysis, bareOrders } = useResults()
  const system = useSessionState((state) => state.system)
  const [of, setOf] = useState<'engine' | 'layout'>('engine')
  const layout = useMemo(() => layoutOrders(train), [train])
  const textbook = useMemo(() => textbookOrders(train), [train])
  const square = toSi(speedRpm, 'rpm') ** 2
  const exact = turningOrders(analysis.orders)
  const rows: OrderRow[] =
    of === 'engine'
      ? [
          ...turningOrders(bareOrders).flatMap((order) =>
            order.order === 1 ? [{ name: '1, bare crank', order }] : [],
          ),
          ...pairs(
            exact,
            textbook.map((order) => atSpeed(order, square)),
          ),
        ]
      : pairs(layout.exact, layout.textbook)
  const kinds = layout.scale.spacing === null && of === 'layout' ? (['force'] as const) : bothKinds
  return (
    <LeafSection title="Forward and backward, by order" at={<SpeedWords />} wide>
      <div className="balance-tools">
        <Segmented
          label="Orders of"
          value={of}
          options={[
            { value: 'engine', label: 'The engine at speed' },
            { value: 'layout', label: 'The layout alone, in F1 and F1·a' },
          ]}
          onChange={setOf}
        />
      </div>
      <div className="order-tables">
        {kinds.map((kind) => {
          if (of === 'layout') return <DataTable key={kind} table={layoutTable(kind, rows)} />
          const table = orderTable(kind, rows, system)
          return (
            <DataTable
              key={kind}
              table={table}
              figure={behindCell(table, (row, column) => behindOrder(kind, rows[row], column))}
            />
          )
        })}
      </div>
      <p className="cap">{of === 'engine' ? engineWords : layoutWords(layout, system)}</p>
    </LeafSection>
  )
}

const behindColumns: Record<(typeof bothKinds)[number], (FigureId | undefined)[]> = {
  force: [undefined, 'order-forward', 'order-backward', 'order-long-axis', 'order-short-axis'],
  couple: [
    undefined,
    'order-couple-forward',
    'order-couple-backward',
    'order-couple-long-axis',
    'order-couple-short-axis',
  ],
}

/** The textbook's first terms stand beside the exact figures and have nothing behind them of their own. */
function behindOrder(kind: (typeof bothKinds)[number], { name, order: { order } }: OrderRow, column: number) {
  const figure = behindColumns[kind][column]
  return figure && !name.endsWith('first term')
    ? { figure, order, bare: name.endsWith('bare crank') }
    : undefined
}

const engineWords =
  'Forward turns with the crank, backward against it; together they draw an ellipse with a long and a short axis, its tilt from straight up. “First term” is the textbook’s short series with the rod as two masses and no offset, beside the exact motion. Couples are about mid crank.'

function layoutWords({ scale }: LayoutOrders, system: System): string {
  const spacing =
    scale.spacing === null ? '' : `, a = ${quantityText(scale.spacing, 'length', system)} between throws`
  const alike = scale.alike
    ? 'All cylinders are alike, so these are the coefficients of balancing tables.'
    : 'The cylinders are not all alike: units are those of their mean.'
  return `Reciprocating masses alone. Order 1 in F1 = mass × throw × speed², order 2 in F2 = F1 × throw/rod (${formatNumber(scale.ratio, { decimals: 3 })}), orders 4 and 6 in their own first terms${spacing}. ${alike} “First term” is the textbook’s, the other the exact motion’s.`
}

const pairs = (exact: readonly OrderTurning[], textbook: readonly OrderTurning[]): OrderRow[] =>
  exact.flatMap((order, i) => [
    { name: String(order.order), order },
    { name: `${order.order}, first term`, order: textbook[i] },
  ])

const atSpeed = ({ order, force, couple }: OrderTurning, square: number): OrderTurning => ({
  order,
  force: times(force, square),
  couple: times(couple, square),
})

const times = ({ forward, backward, major, minor, tilt }: Turning, by: number): Turning => ({
  forward: { ...forward, size: forward.size * by },
  backward: { ...backward, size: backward.size * by },
  major: major * by,
  minor: minor * by,
  tilt,
})
