'use client'

import { useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import { SpeedWords } from '@/components/figures/speed-words'
import { TypedField } from '@/components/figures/typed-field'
import { useTyped } from '@/components/figures/use-typed'
import { Segmented } from '@/components/ui/segmented'
import { massSplit } from '@/lib/mechanics/balance'
import { massEffect, type MassChange } from '@/lib/mechanics/balance/mass-change'
import { bearingPlanes } from '@/lib/mechanics/balance/two-planes'
import { formatQuantity, quantityText } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { permissibleIn, USUAL_GRADE } from './grade-choice'
import { PlanesTable } from './planes-table'
import { shownIn } from './use-planes'

const ALL = ''
const TWO_GRAMS = 0.002

/** What a heavier or lighter part makes of a crank that is not balanced again. */
export function ChangeSection() {
  const { train, document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const [moves, setMoves] = useState<MassChange['moves']>('reciprocating')
  const [cylinder, setCylinder] = useState<string | null>(null)
  const own = train.cylinders.findIndex(({ id }) => id === cylinder)
  const cylinders = cylinder === ALL ? train.cylinders.map((_, index) => index) : [own < 0 ? 0 : own]
  const lightest = Math.min(...cylinders.map((index) => massSplit(train.cylinders[index])[moves]))
  const mass = useTyped('mass', system, TWO_GRAMS, (value) =>
    value > -lightest
      ? null
      : `Read as ${quantityText(value, 'mass', system)}. The lightest of these parts weighs ${quantityText(lightest, 'mass', system)}.`,
  )
  const given = Math.max(mass.value ?? 0, -0.999 * lightest)
  const effect = massEffect(train, { cylinders, moves, mass: given })
  const square = toSi(speedRpm, 'rpm') ** 2
  const places = bearingPlanes(train)
  const allowed = places && permissibleIn(train, places, USUAL_GRADE)
  return (
    <LeafSection title="If a part changes" at={<SpeedWords />}>
      <Segmented
        label="Which part"
        value={moves}
        options={[
          { value: 'reciprocating', label: 'Piston, pin, rings' },
          { value: 'rotating', label: 'Big end, shells' },
        ]}
        onChange={setMoves}
      />
      <div className="balance-fields">
        <TypedField label="Heavier by" typed={mass} shown={formatQuantity(mass.value ?? 0, 'mass', system)} />
        <label className="typed-field">
          <span>In cylinder</span>
          <select
            className="pick"
            value={cylinder === ALL ? ALL : document.cylinders[cylinders[0]].id}
            onChange={(event) => setCylinder(event.target.value)}
          >
            {document.cylinders.length > 1 ? <option value={ALL}>all alike</option> : null}
            {document.cylinders.map(({ id }) => (
              <option key={id}>{id}</option>
            ))}
          </select>
        </label>
      </div>
      <Figures
        rows={[
          {
            name: 'Adds to the residual',
            figure: formatQuantity(effect.change.static.size, 'unbalance', system),
          },
          {
            name: 'As a couple',
            figure: formatQuantity(effect.change.couple.size, 'coupleUnbalance', system),
          },
          {
            name: 'Turning force',
            figure: formatQuantity(effect.change.static.size * square, 'force', system),
          },
          {
            name: 'Turning couple',
            figure: formatQuantity(effect.change.couple.size * square, 'torque', system),
          },
          ...(moves === 'reciprocating'
            ? [
                {
                  name: 'Along each bore, first order',
                  figure: formatQuantity(effect.alongBore * square, 'force', system),
                },
              ]
            : []),
        ]}
      />
      {places ? (
        <PlanesTable
          caption="Residual unbalance with the changed part"
          rows={shownIn(effect.after, places, train.referenceAxial).map((unbalance, i) => ({
            name: 'AB'[i],
            place: places[i],
            unbalance,
            permissible: allowed![i],
          }))}
        />
      ) : null}
      <p className="cap">
        The crank stays as it is. A bob-weight changes by the whole of a turning part and by the balance
        factor’s share of a reciprocating one
        {places ? `; allowed is G ${USUAL_GRADE} at the outer bearings` : ''}.
      </p>
    </LeafSection>
  )
}
