'use client'

import { useMemo, useState } from 'react'
import { BehindFigure } from '@/components/figures/behind'
import { behindCell } from '@/components/figures/behind-cell'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import { SpeedWords } from '@/components/figures/speed-words'
import { DataTable } from '@/components/ui/data-table'
import { Segmented } from '@/components/ui/segmented'
import { Switch } from '@/components/ui/switch'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { loadParts, type LoadPart } from '@/lib/mechanics/loads/part-signals'
import type { Sector } from '@/lib/mechanics/loads/surface-load'
import type { Table } from '@/lib/tables/table'
import { formatNumber, formatQuantity } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { useResults, useSessionState } from '@/scene/session/react'
import type { FigureId } from '@/lib/mechanics/explain/explain'
import type { Bearing } from '@/lib/mechanics/loads/bearings'
import { DEGREES, degreesText, quantityAxis } from '@/components/figures/axis'
import { BearingPolar } from './bearing-polar'
import { surfaceWords, type Frame } from './bearing-words'
import { useBearings, type BearingAtSpeed } from './use-bearings'

/** Which bearing, in which frame, and what of its load. */
export function BearingSection({ parts }: { parts: CycleParts }) {
  const { document } = useResults()
  const system = useSessionState((state) => state.system)
  const all = useBearings(parts)
  const [chosenName, setChosenName] = useState<string | null>(null)
  const [frame, setFrame] = useState<Frame>('journal')
  const [on, setOn] = useState<Record<LoadPart, boolean>>({ gas: true, inertia: true, total: true })
  const found = all.findIndex(({ name }) => name === chosenName)
  const chosen = found < 0 ? 0 : found
  const of = all[chosen]
  const gas = document.gas.model !== 'none'
  const shown = useMemo(() => {
    const wished = loadParts.filter((part) => on[part] && (gas || part !== 'gas'))
    return wished.length > 0 ? wished : (['total'] as LoadPart[])
  }, [on, gas])
  const table = useMemo(() => bearingTable(all, system), [all, system])

  return (
    <LeafSection title="Bearings" at={<SpeedWords />} wide>
      <div className="loads-tools">
        <label className="pick-label">
          bearing{' '}
          <select className="pick" value={of.name} onChange={(event) => setChosenName(event.target.value)}>
            {all.map(({ name }) => (
              <option key={name}>{name}</option>
            ))}
          </select>
        </label>
        <Segmented
          label="Seen from"
          value={frame}
          options={[
            { value: 'journal', label: 'On the journal' },
            { value: 'block', label: 'In the block' },
          ]}
          onChange={setFrame}
        />
        <span className="loads-parts" role="group" aria-label="Load of">
          {loadParts
            .filter((part) => gas || part !== 'gas')
            .map((part) => (
              <Switch
                key={part}
                label={part}
                on={shown.includes(part)}
                onChange={(wanted) => setOn({ ...on, [part]: wanted })}
              />
            ))}
        </span>
      </div>
      <div className="loads-pair">
        <BearingPolar parts={parts} of={of} frame={frame} shown={shown} />
        <div className="loads-side">
          <BearingFigures of={of} />
          <SectorWords of={of} frame={frame} />
          <p className="cap">
            {of.bearing.kind === 'main'
              ? 'The load is what the crank puts on its main. It presses the side it points to.'
              : 'The load is what the rods put on the pin. It presses the side it comes from.'}{' '}
            Angles run in the direction of rotation, drawn clockwise.
          </p>
        </div>
      </div>
      {parts.train.mains.length < 2 ? (
        <p className="say">Fewer than two mains are described: their loads cannot be told.</p>
      ) : null}
      <DataTable
        table={table}
        chosen={chosen}
        onChoose={(row) => setChosenName(all[row].name)}
        figure={behindCell(table, (row, column) => {
          const figure = behindColumns[column]
          return figure && { figure, ...asked(all[row].bearing) }
        })}
        page={16}
      />
      <p className="cap">
        Means and peaks are of the size of the load. Least loaded: the 60° of the surface with the least of
        what presses on it over the cycle, each load counted by its part square to the surface.
      </p>
    </LeafSection>
  )
}

const behindColumns: (FigureId | undefined)[] = [
  undefined,
  'bearing-peak',
  undefined,
  'bearing-mean',
  'bearing-peak-on-area',
]

/** Which bearing is asked about. */
const asked = ({ kind, id }: Bearing) =>
  kind === 'main' ? { main: id } : kind === 'pin' ? { throw: id } : { cylinder: id }

function BearingFigures({ of: { bearing, figures, area } }: { of: BearingAtSpeed }) {
  const system = useSessionState((state) => state.system)
  return (
    <Figures
      rows={[
        {
          name: `Most, at ${degreesText(figures.peakAngle)}`,
          figure: formatQuantity(figures.peak, 'force', system),
          behind: { figure: 'bearing-peak', ...asked(bearing) },
        },
        {
          name: 'Mean',
          figure: formatQuantity(figures.mean, 'force', system),
          behind: { figure: 'bearing-mean', ...asked(bearing) },
        },
        ...(figures.specific === undefined || area === undefined
          ? []
          : [
              {
                name: 'Most, on its area',
                figure: formatQuantity(figures.specific, 'stress', system),
                behind: { figure: 'bearing-peak-on-area', ...asked(bearing) } as const,
              },
              {
                name: 'Mean, on its area',
                figure: formatQuantity(figures.mean / area, 'stress', system),
                behind: { figure: 'bearing-mean-on-area', ...asked(bearing) } as const,
              },
            ]),
      ]}
    />
  )
}

function SectorWords({ of, frame }: { of: BearingAtSpeed; frame: Frame }) {
  const sector = frame === 'block' ? of.block : of.journal
  const noSize =
    of.area === undefined && of.bearing.kind !== 'knuckle'
      ? ' Its diameter and length are not entered, so there is no load on its area.'
      : ''
  if (!sector)
    return (
      <p className="say">
        The pin turns in the block, so its surface has no place there: see it on the journal.{noSize}
      </p>
    )
  const { surface, from } = surfaceWords(of.bearing, frame)
  const share = `${formatNumber(100 * sector.share, { decimals: 0 })} %`
  return (
    <p className="say">
      The {surface} is least loaded from {sectorText(sector)}, counted from {from}: it bears{' '}
      {frame === 'journal' ? (
        <BehindFigure
          behind={{ figure: 'least-loaded-sector', ...asked(of.bearing) }}
          label={`Least loaded sector, ${share}`}
        >
          {share}
        </BehindFigure>
      ) : (
        share
      )}{' '}
      of the mean all round. An oil hole may sit there.
      {noSize}
    </p>
  )
}

const sectorText = ({ from, to }: Sector) => `${degreesText(from)} to ${degreesText(to % (2 * Math.PI))}`

function bearingTable(all: BearingAtSpeed[], system: System): Table {
  const force = quantityAxis('', 'force', Math.max(...all.map(({ figures }) => figures.peak)), system)
  const stress = quantityAxis(
    '',
    'stress',
    Math.max(0, ...all.map(({ figures }) => figures.specific ?? 0)),
    system,
  )
  return {
    title: 'Loads of all bearings',
    columns: [
      { name: 'Bearing', unit: '' },
      force.column('Most'),
      { name: 'at', unit: '°', decimals: 0 },
      force.column('Mean'),
      stress.column('Most on its area'),
      { name: 'Least loaded from', unit: '°', decimals: 0 },
      { name: 'to', unit: '°', decimals: 0 },
    ],
    rows: all.map(({ name, figures, journal }) => [
      name,
      force.shown(figures.peak),
      figures.peakAngle * DEGREES,
      force.shown(figures.mean),
      figures.specific === undefined ? null : stress.shown(figures.specific),
      Math.round(journal.from * DEGREES),
      Math.round(journal.to * DEGREES) % 360,
    ]),
  }
}
