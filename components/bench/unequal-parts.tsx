'use client'

import { useId, useState } from 'react'
import { Icon } from '@/components/ui/icon'
import { NumberField } from '@/components/ui/number-field'
import { withUnit } from '@/lib/units/format'
import { useBench, useSessionState } from '@/scene/session/react'
import { FoldedRow } from './folded-row'
import { differ, ownNames, ownValues, statesOwn, type OwnField } from './own-fields'
import { RefusedNote } from '@/components/figures/refused-note'

const KEY = 'table.unequal'

/** What some cylinder has otherwise than the rest, each value with a way back to the common one. */
export function UnequalParts({ number }: { number: number }) {
  const train = useSessionState(({ scene }) => scene.train)
  const refused = useSessionState((state) => state.refused)
  const own = ownValues(train)
  const bad = own.some(({ field }) => refused[field.key])
  return (
    <FoldedRow
      row={KEY}
      number={number}
      label="Unequal parts"
      count={own.length === 0 ? 'none' : own.length}
      bad={bad}
    >
      <div className="subtable">
        {own.length > 0 ? (
          <table>
            <thead>
              <tr>
                <th scope="col">Cylinder</th>
                <th scope="col">Part</th>
                <th scope="col">its own</th>
                <th scope="col">the others</th>
                <th scope="col">Reset</th>
              </tr>
            </thead>
            <tbody>
              {own.map((one) => (
                <OwnRow key={one.field.key} own={one} />
              ))}
            </tbody>
          </table>
        ) : (
          <p className="cap">All cylinders are alike.</p>
        )}
        {own
          .filter(({ field }) => refused[field.key])
          .map(({ field }) => (
            <RefusedNote
              key={field.key}
              id={`note-${field.key}`}
              refusal={refused[field.key]}
              field={field}
              stands="what it was"
            />
          ))}
        <AddOwn />
      </div>
    </FoldedRow>
  )
}

function OwnRow({ own: { field, common, cylinder, reset } }: { own: OwnField }) {
  const { session } = useBench()
  const id = useId()
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const refusal = useSessionState((state) => state.refused[field.key])
  const understood = useSessionState(({ understood: of }) => (of?.key === field.key ? of.text : undefined))
  const name = scene.train.cylinders[cylinder].id
  const shown = field.show(scene, system)
  const others = common.show(scene, system)
  const differs = field.get(scene) !== common.get(scene)
  return (
    <tr className={differs ? 'differs' : undefined}>
      <th scope="row">{name}</th>
      <td>{common.label}</td>
      <td>
        <NumberField
          id={id}
          look="line"
          label={`${common.label} of cylinder ${name}`}
          text={shown.text}
          unit={shown.unit}
          refused={refusal?.text}
          understood={understood}
          describedBy={refusal ? `note-${field.key}` : undefined}
          onText={(text) => session.enter(field, text)}
          onDone={session.seal}
          onEscape={() => session.drop(field.key)}
        />
      </td>
      <td className="fig">{others.text === '' ? '–' : withUnit(others.text, others.unit)}</td>
      <td>
        <button
          type="button"
          className="btn sm ic"
          aria-label={`Reset ${common.label} of cylinder ${name}`}
          onClick={() => {
            session.drop(field.key)
            session.edit(reset(session.getState().scene))
          }}
        >
          <Icon name="undo" />
        </button>
      </td>
    </tr>
  )
}

function AddOwn() {
  const { session } = useBench()
  const train = useSessionState(({ scene }) => scene.train)
  const { cylinders } = train
  const [cylinder, setCylinder] = useState(0)
  const [which, setWhich] = useState(5)
  const at = Math.min(cylinder, cylinders.length - 1)
  return (
    <div className="add-own">
      <label className="pick-label">
        Cylinder{' '}
        <select className="pick" value={at} onChange={(event) => setCylinder(Number(event.target.value))}>
          {cylinders.map(({ id }, index) => (
            <option key={id} value={index}>
              {id}
            </option>
          ))}
        </select>
      </label>
      <label className="pick-label">
        part{' '}
        <select className="pick" value={which} onChange={(event) => setWhich(Number(event.target.value))}>
          {ownNames.map(({ index, name }) => (
            <option key={name} value={index}>
              {name}
            </option>
          ))}
        </select>
      </label>
      <button
        type="button"
        className="btn sm"
        disabled={statesOwn(train, which, at)}
        onClick={() => session.edit(differ(which, at, session.getState().scene))}
      >
        This cylinder differs
      </button>
    </div>
  )
}
