'use client'

import { CrankStar } from '@/components/drawing/crank-star'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import type { Layout, LayoutRequest, Turning } from '@/lib/mechanics/layouts/layout'
import { formatNumber } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import type { CrankTrain } from '@/scene/model/crank-train'
import { criterionWords, shown } from './criteria'
import { degreesText, layoutText, orderText } from './words'

/** What the crank star needs of a layout. */
export const starOf = (layout: Layout, rotation: CrankTrain['rotation']) => {
  const pin = (angle: number, id: string) => ({
    id,
    angleDeg: fromSi(angle, '°'),
    axialMm: 0,
    unbalanceKgMm: 0,
  })
  const half = layout.bankAngle === null ? [0] : [-layout.bankAngle / 2, layout.bankAngle / 2]
  return {
    rotation,
    banks: half.map((angle, i) => ({ id: 'AB'[i], angleDeg: fromSi(angle, '°') })),
    throws: layout.throwAngles.flatMap((angle, k) =>
      layout.split === 0 ? [pin(angle, `${k}`)] : [pin(angle, `${k}a`), pin(angle + layout.split, `${k}b`)],
    ),
  }
}

interface Props {
  layout: Layout
  request: LayoutRequest
  /** Its place in the list. */
  place: number | null
  rotation: CrankTrain['rotation']
  onBench: boolean
  onOpen(): void
}

/** One layout in full, and the way to the bench. */
export function LayoutFigures({ layout, request, place, rotation, onBench, onOpen }: Props) {
  const figure = (value: number, unit: string, decimals: number) => ({
    text: formatNumber(value, { decimals }),
    unit,
  })
  const turning = (name: string, { forward, backward }: Turning, unit: string) => (
    <tr key={name}>
      <th scope="row">{name}</th>
      <td className="n">{formatNumber(forward, { decimals: 3 })}</td>
      <td className="n">{formatNumber(backward, { decimals: 3 })}</td>
      <td className="un">{unit}</td>
    </tr>
  )
  return (
    <LeafSection
      title={layoutText(layout, request)}
      at={place === null ? 'the nearest miss' : `layout ${place}`}
    >
      <div className="layout-one">
        <CrankStar
          train={starOf(layout, rotation)}
          label={`Crank star: throws at ${layoutText(layout, request)}`}
        />
        <div>
          <p className="fig">{orderText(layout)}</p>
          <p className="cap">
            {layout.even
              ? `even, every ${degreesText(layout.intervals[0])}°`
              : `${layout.intervals.map(degreesText).join('-')}°`}
            {layout.alike > 1
              ? `; ${layout.alike - 1} more ${layout.alike === 2 ? 'order is' : 'orders are'} as good`
              : ''}
          </p>
        </div>
      </div>
      <Figures
        rows={criterionWords
          .filter(({ id }) => id !== 'sameBank' || layout.bankAngle !== null)
          .map(({ id, said, unit, decimals }) => ({
            name: `${said[0].toUpperCase()}${said.slice(1)}`,
            figure: figure(shown(id, layout[id]), unit, decimals),
          }))}
      />
      <table className="tab bare-parts">
        <caption className="cap">Bare crank, by its sense of turning</caption>
        <thead>
          <tr>
            <th scope="col">Part</th>
            <th scope="col" className="r">
              forward
            </th>
            <th scope="col" className="r">
              backward
            </th>
            <th scope="col">unit</th>
          </tr>
        </thead>
        <tbody>
          {turning('Force 1', layout.force1, 'F1')}
          {turning('Couple 1', layout.couple1, 'F1 a')}
          {turning('Force 2', layout.force2, 'F2')}
          {turning('Couple 2', layout.couple2, 'F2 a')}
        </tbody>
      </table>
      <p className="layout-open">
        <button type="button" className="btn pri" onClick={onOpen}>
          Open on the bench
        </button>
        <span className="cap" role="status">
          {onBench ? 'It is on the bench now; undo brings the drawing before it back.' : ''}
        </span>
      </p>
    </LeafSection>
  )
}
