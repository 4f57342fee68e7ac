'use client'

import { useMemo } from 'react'
import { quantityAxis } from '@/components/figures/axis'
import { LeafSection } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { TypedField } from '@/components/figures/typed-field'
import { useTyped } from '@/components/figures/use-typed'
import { DataTable } from '@/components/ui/data-table'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { nodesOf } from '@/lib/mechanics/torsion/shaft-modes'
import { STEEL_SHEAR } from '@/lib/mechanics/torsion/shaft-stiffness'
import type { Table } from '@/lib/tables/table'
import { fileUnit } from '@/lib/units/file-unit'
import { formatQuantity, quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import { useSessionState } from '@/scene/session/react'
import { ModeShapes, SpeedFrequency } from './torsion-charts'
import { criticalsSentence, lackingSentence, metFirst, placeWords } from './torsion-words'
import { useTorsion, type Torsion } from './use-torsion'

/** Natural frequencies and shapes of the crank in torsion, and the speeds at which orders meet them. */
export function TorsionSection({ parts }: { parts: CycleParts }) {
  const system = useSessionState((state) => state.system)
  const shear = useTyped('modulus', system, STEEL_SHEAR, (value) => judgeShear(value, system))
  const stiffnessUnit = system === 'us' ? 'lbf ft/rad' : 'kN m/rad'
  const byThrow = useTyped('torsionalStiffness', stiffnessUnit, undefined, (value) =>
    judgeStiffness(value, system),
  )
  const { torsion, missing } = useTorsion(parts, shear.value!, byThrow.value)
  return (
    <LeafSection title="Torsion" wide>
      <div className="loads-tools">
        <TypedField
          label="Shear modulus"
          typed={shear}
          shown={formatQuantity(shear.value!, 'modulus', system)}
        />
        <TypedField
          label="Stiffness of a throw, main to main"
          typed={byThrow}
          shown={
            byThrow.value === undefined
              ? { text: '', unit: stiffnessUnit }
              : formatQuantity(byThrow.value, 'torsionalStiffness', system, undefined, {
                  unit: stiffnessUnit,
                  digits: { significant: 4 },
                })
          }
        />
        {byThrow.value === undefined ? null : (
          <button type="button" className="btn sm" onClick={byThrow.drop}>
            Go by the sizes again
          </button>
        )}
      </div>
      {missing.inertias.length > 0 ? (
        <p className="say" role="status">
          {lackingSentence(missing.inertias)} An end without inertia has nothing to swing against.
        </p>
      ) : null}
      {missing.sizes.length > 0 && byThrow.value === undefined ? (
        <p className="say" role="status">
          {lackingSentence(missing.sizes, 'the stiffness of a throw above')}
        </p>
      ) : null}
      {torsion ? <TorsionFigures parts={parts} torsion={torsion} /> : null}
    </LeafSection>
  )
}

function TorsionFigures({ parts, torsion }: { parts: CycleParts; torsion: Torsion }) {
  const system = useSessionState((state) => state.system)
  const { train } = parts
  const { criticals, range, assumptions } = torsion
  const tables = useMemo(
    () => ({
      modes: modeTable(torsion),
      chain: chainTable(torsion, system),
      criticals: criticalTable(torsion),
    }),
    [torsion, system],
  )
  return (
    <>
      <div className="loads-pair">
        <ModeShapes torsion={torsion} />
        <SpeedFrequency torsion={torsion} operating={train.operating} />
      </div>
      <DataTable table={tables.modes} page={12} />
      <p className="say">Criticals: {criticalsSentence(criticals, range, train.cylinders.length)}</p>
      <DataTable table={tables.criticals} page={12} />
      <p className="cap">
        The vector sum is of the cylinders’ phase vectors at that order, each as long as the mode’s shape at
        its throw: the more it is, the more they feed the mode together. How far the crank then swings depends
        on the turning moment of that order too, which is small at high orders, and on damping, which is not
        in these figures.
      </p>
      <DataTable table={tables.chain} page={16} />
      <ul className="cap">
        {assumptions.map(({ code, message }) => (
          <li key={code}>{message}</li>
        ))}
      </ul>
      <Caution />
    </>
  )
}

const hertz = (frequency: number) => frequency / (2 * Math.PI)

const modeTable = ({ modes, stations }: Torsion): Table => ({
  title: 'Modes',
  columns: [
    { name: 'Mode', unit: '' },
    { name: 'Nodes', unit: '' },
    { name: 'Frequency', unit: 'Hz', decimals: 1 },
    { name: 'Per minute', unit: '1/min', decimals: 0 },
    ...stations.map((name) => ({ name, unit: '', decimals: 3 })),
  ],
  rows: modes.map(({ frequency, shape }, i) => [
    i + 1,
    nodesOf(shape),
    hertz(frequency),
    60 * hertz(frequency),
    ...shape,
  ]),
})

const criticalTable = ({ criticals }: Torsion): Table => ({
  title: 'Critical speeds by order, those in or near the running range first',
  columns: [
    { name: 'Order', unit: '' },
    { name: 'Mode', unit: '' },
    { name: 'Speed', unit: 'rpm', decimals: 0 },
    { name: 'Vector sum', unit: '', decimals: 2 },
    { name: 'Running range', unit: '' },
  ],
  rows: metFirst(criticals).map(({ order, mode, speed, vectorSum, place }) => [
    order,
    mode + 1,
    fromSi(speed, 'rpm'),
    vectorSum,
    placeWords(place),
  ]),
})

function chainTable({ stations, inertias, stiffnesses }: Torsion, system: System): Table {
  const stiffness = quantityAxis('', 'torsionalStiffness', Math.max(...stiffnesses), system)
  const unit = system === 'us' ? 'lb ft²' : 'kg m²'
  return {
    title: 'The crank as inertias and springs',
    columns: [
      { name: 'At', unit: '' },
      { name: 'Inertia', unit, si: fileUnit(unit) },
      stiffness.column('Stiffness to the next'),
    ],
    rows: stations.map((name, i) => [
      name,
      fromSi(inertias[i], unit),
      i < stiffnesses.length ? stiffness.shown(stiffnesses[i]) : null,
    ]),
  }
}

const judgeShear = (value: number, system: System) =>
  value > 0 && value <= 1e12
    ? null
    : `Read as ${quantityText(value, 'modulus', system, { significant: 4 })}. A shear modulus is above 0 and ${quantityText(1e12, 'modulus', system)} at most; steel has ${quantityText(STEEL_SHEAR, 'modulus', system)}.`

const judgeStiffness = (value: number, system: System) =>
  value > 0 && value <= 1e15
    ? null
    : `Read as ${quantityText(value, 'torsionalStiffness', system, { significant: 4 })}. A throw without a stiffness above 0 would not hold its neighbours.`
