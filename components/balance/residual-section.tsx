'use client'

import { useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import { TypedField } from '@/components/figures/typed-field'
import { residualUnbalance } from '@/lib/mechanics/balance'
import { balanceGrades, crankDriveGrades } from '@/lib/mechanics/balance/two-planes'
import { formatNumber, formatQuantity } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import { plainField } from '@/scene/session/plain-field'
import { useResults, useSessionState } from '@/scene/session/react'
import { DocumentField } from '@/components/figures/document-field'
import { permissibleIn, USUAL_GRADE } from './grade-choice'
import { PlanesTable } from './planes-table'
import { shownIn, usePlanes } from './use-planes'

const crankMass = plainField(['crankMassKg'], 'Crank mass', 'mass', 'kg', { optional: true })
const maxSpeed = plainField(['operating', 'maxRpm'], 'Greatest speed', 'speed', 'rpm', { optional: true })

/** What a balancing machine would show in two planes, against the grade. */
export function ResidualSection() {
  const { train } = useResults()
  const system = useSessionState((state) => state.system)
  const [grade, setGrade] = useState<number>(USUAL_GRADE)
  const { near, far, places } = usePlanes()
  const residual = residualUnbalance(train)
  const length = (value: number | undefined) =>
    value === undefined ? { text: '', unit: '' } : formatQuantity(value, 'length', system)
  const allowed = places && permissibleIn(train, places, grade)
  const kinds = Object.entries(crankDriveGrades).filter(([, value]) => value === grade)
  return (
    <LeafSection
      title="Residual in two planes"
      at={
        train.operating.max === undefined
          ? undefined
          : `at ${formatNumber(fromSi(train.operating.max, 'rpm'), { decimals: 0 })} rpm, the greatest`
      }
    >
      <div className="balance-fields">
        <TypedField label="Plane A, along the crank" typed={near} shown={length(near.value)} />
        <TypedField label="Plane B" typed={far} shown={length(far.value)} />
        <label className="typed-field">
          <span>Grade of ISO 21940-11</span>
          <select
            className="pick"
            value={String(grade)}
            onChange={(event) => setGrade(Number(event.target.value))}
          >
            {balanceGrades.map((each) => (
              <option key={each} value={String(each)}>
                G {each}
              </option>
            ))}
          </select>
        </label>
      </div>
      {kinds.length > 0 ? (
        <p className="cap">
          The standard names G {grade} for: {kinds[0][0]}.
        </p>
      ) : null}
      {places ? (
        <PlanesTable
          caption="Residual unbalance in two planes"
          rows={shownIn(residual, places, train.referenceAxial).map((unbalance, i) => ({
            name: 'AB'[i],
            place: places[i],
            unbalance,
            permissible: allowed![i],
            behind: behindPlane(places, i, grade),
          }))}
        />
      ) : (
        <p className="read">
          {near.value === far.value && near.value !== undefined
            ? 'Both planes stand at one place: a couple cannot be seen there. Give plane B another.'
            : 'One throw and no mains: type two places along the crank to see the residual in them.'}
        </p>
      )}
      <Figures
        rows={[
          {
            name: 'Static, whole',
            figure: formatQuantity(residual.static.size, 'unbalance', system),
            behind: 'residual-static',
          },
          {
            name: 'Couple',
            figure: formatQuantity(residual.couple.size, 'coupleUnbalance', system),
            behind: 'residual-couple',
          },
        ]}
      />
      {train.crankMass === undefined || train.operating.max === undefined ? (
        <>
          <p className="say">
            {train.crankMass === undefined
              ? 'Without the crank’s mass the standard allows nothing in particular: weigh it.'
              : 'Without a greatest speed the standard allows nothing in particular.'}
          </p>
          <div className="balance-fields">
            {train.crankMass === undefined ? <DocumentField field={crankMass} /> : null}
            {train.operating.max === undefined ? <DocumentField field={maxSpeed} /> : null}
          </div>
        </>
      ) : (
        <p className="cap">
          Allowed in all = mass × grade ÷ speed, split between the planes by their distances from the crank’s
          centre of gravity, taken half-way. Crank with bob-weights, without the oil.
        </p>
      )}
    </LeafSection>
  )
}

function behindPlane(places: readonly [number, number], i: number, gradeMmS: number) {
  const [planeMm, otherPlaneMm] = [places[i], places[1 - i]].map((place) => fromSi(place, 'mm'))
  return {
    residual: { figure: 'plane-residual', planeMm, otherPlaneMm },
    permissible: { figure: 'plane-permissible', planeMm, otherPlaneMm, gradeMmS },
  } as const
}
