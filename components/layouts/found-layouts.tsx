'use client'

import { useMemo, useState } from 'react'
import { CrankStar } from '@/components/drawing/crank-star'
import { LeafSection } from '@/components/figures/leaf'
import { ScatterChart } from '@/components/ui/charts/scatter-chart'
import { DataTable } from '@/components/ui/data-table'
import type { LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { Criterion, Layout, LayoutRequest } from '@/lib/mechanics/layouts/layout'
import type { Table } from '@/lib/tables/table'
import { formatNumber } from '@/lib/units/format'
import type { CrankTrain } from '@/scene/model/crank-train'
import { criterionWords, shown, wordsOf } from './criteria'
import { LayoutFigures, starOf } from './layout-figures'
import { degreesText, layoutText, orderText, throwsText } from './words'

interface Props {
  request: LayoutRequest
  found: LayoutSearch
  rotation: CrankTrain['rotation']
  chosen: number
  onBench: Layout | null
  onChoose(row: number): void
  onOpen(layout: Layout): void
}

const shapes = { dot: 'fires evenly', ring: 'fires unevenly' } as const

/** The trade-off, one layout of it in full, and all of them as a table. */
export function FoundLayouts({ request, found, rotation, chosen, onBench, onChoose, onOpen }: Props) {
  const { layouts } = found
  const [across, setAcross] = useState<Criterion>('secondForce')
  const [up, setUp] = useState<Criterion>('counterweight')
  const axis = (id: Criterion) => {
    const { said, unit, decimals } = wordsOf(id)
    const name = `${said[0].toUpperCase()}${said.slice(1)}`
    return { name, unit, format: (value: number) => formatNumber(value, { decimals: Math.min(decimals, 2) }) }
  }
  const points = useMemo(
    () =>
      layouts.map((layout, i) => ({
        name: `${i + 1}: ${layoutText(layout, request)}, ${orderText(layout)}`,
        x: shown(across, layout[across]),
        y: shown(up, layout[up]),
        shape: layout.even ? ('dot' as const) : ('ring' as const),
      })),
    [layouts, request, across, up],
  )
  const table = useMemo(() => tableOf(layouts, request), [layouts, request])
  const axisChoice = (label: string, value: Criterion, onChange: (id: Criterion) => void) => (
    <label className="pick-label">
      {label}{' '}
      <select className="pick" value={value} onChange={(event) => onChange(event.target.value as Criterion)}>
        {criterionWords.map(({ id, said }) => (
          <option key={id} value={id}>
            {said}
          </option>
        ))}
      </select>
    </label>
  )
  return (
    <>
      <LeafSection title="Trade-off" at="click a point, or read with arrow keys and Enter">
        <p className="layout-axes">
          {axisChoice('across', across, setAcross)} {axisChoice('up', up, setUp)}
        </p>
        <ScatterChart
          title="Layouts"
          sentence={tradeWords(layouts, across, up)}
          x={axis(across)}
          y={axis(up)}
          points={points}
          shapes={shapes}
          chosen={chosen}
          onChoose={onChoose}
        />
      </LeafSection>
      <LayoutFigures
        layout={layouts[chosen]}
        request={request}
        place={chosen + 1}
        onBench={onBench === layouts[chosen]}
        rotation={rotation}
        onOpen={() => onOpen(layouts[chosen])}
      />
      <LeafSection title="All layouts found" at={`${layouts.length}, best first`} wide>
        <DataTable
          table={table}
          chosen={chosen}
          onChoose={onChoose}
          page={20}
          more={{
            head: 'Crank',
            cell: (row) => (
              <span className="layout-row">
                <CrankStar train={starOf(layouts[row], rotation)} />
                <button
                  type="button"
                  className="btn sm"
                  aria-label={`Open layout ${row + 1} on the bench`}
                  onClick={(event) => {
                    event.stopPropagation()
                    onOpen(layouts[row])
                  }}
                >
                  Open
                </button>
              </span>
            ),
          }}
        />
        <p className="cap">
          F1 is m r times the square of the speed, m the reciprocating mass of one cylinder and r its throw;
          F2 is r/l of that, l the rod; a is the spacing of the throws. Force 1 and couple 1 are what the
          least counterweights leave, weight is the largest of these; they stand on two webs a throw and
          balance the crank with its bob-weights at{' '}
          {formatNumber(100 * request.balanceFactor, { decimals: 0 })} % of the present masses. Rods of one
          throw are taken to stand at one place. Near throw: firings followed by one on the same or the next
          throw. Like it: orders of the phasing that none of these tells apart.
        </p>
      </LeafSection>
    </>
  )
}

function tradeWords(layouts: readonly Layout[], across: Criterion, up: Criterion): string {
  const range = (id: Criterion) => {
    const { said, unit, decimals } = wordsOf(id)
    const values = layouts.map((layout) => shown(id, layout[id]))
    const text = (value: number) => formatNumber(value, { decimals: Math.min(2, decimals) })
    return `${said} ${text(Math.min(...values))} to ${text(Math.max(...values))}${unit === '°' ? '°' : unit === '' ? '' : ` ${unit}`}`
  }
  const even = layouts.filter((layout) => layout.even).length
  return `${layouts.length === 1 ? 'One layout' : `${layouts.length} layouts`}, ${even} of them even: ${range(across)}, ${range(up)}.`
}

function tableOf(layouts: readonly Layout[], request: LayoutRequest): Table {
  const banks = request.bankAngles.length > 1
  const splits = request.splits.length > 1
  const columns = criterionWords.filter(({ id }) => id !== 'sameBank' || request.bankAngles.length > 0)
  return {
    title: 'Layouts, best first',
    columns: [
      { name: 'No.', unit: '', decimals: 0 },
      { name: 'Throws', unit: '°' },
      ...(banks ? [{ name: 'Bank angle', unit: '°', decimals: 1 }] : []),
      ...(splits ? [{ name: 'Split', unit: '°', decimals: 1 }] : []),
      { name: 'Firing order', unit: '' },
      ...columns.map(({ column, unit, decimals }) => ({ name: column, unit, decimals })),
      { name: 'Like it', unit: '', decimals: 0 },
    ],
    rows: layouts.map((layout, i) => [
      i + 1,
      throwsText(layout),
      ...(banks ? [Number(degreesText(layout.bankAngle ?? 0))] : []),
      ...(splits ? [Number(degreesText(layout.split).replace('\u2212', '-'))] : []),
      orderText(layout),
      ...columns.map(({ id }) => shown(id, layout[id])),
      layout.alike,
    ]),
  }
}
