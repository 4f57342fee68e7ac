'use client'

import { BehindFigure, type Behind } from '@/components/figures/behind'
import type { Phasor } from '@/lib/mechanics/balance'
import { formatQuantity, quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { useSessionState } from '@/scene/session/react'

export interface PlaneRow {
  name: string
  place: number
  unbalance: Phasor
  permissible: number | null
  /** What stands behind the two, where it is the engine as it is. */
  behind?: { residual: Behind; permissible: Behind }
}

/** What reads as nothing points nowhere. */
const isNothing = ({ size }: Phasor, system: System) =>
  !/[1-9]/.test(formatQuantity(size, 'unbalance', system).text)

/** Residual unbalance plane by plane, with the word whether it is allowed. */
export function PlanesTable({ rows, caption }: { rows: PlaneRow[]; caption: string }) {
  const system = useSessionState((state) => state.system)
  return (
    <table className="tab planes-table">
      <caption className="vh">{caption}</caption>
      <thead>
        <tr>
          <th scope="col">Plane</th>
          <th scope="col" className="r">
            Along
          </th>
          <th scope="col" className="r">
            Residual
          </th>
          <th scope="col" className="r">
            At
          </th>
          <th scope="col" className="r">
            Allowed
          </th>
          <th scope="col">
            <span className="vh">Verdict</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ name, place, unbalance, permissible, behind }) => (
          <tr key={name}>
            <th scope="row">{name}</th>
            <td className="n">{quantityText(place, 'length', system)}</td>
            <td className="n">
              <Pressed behind={behind?.residual} text={quantityText(unbalance.size, 'unbalance', system)} />
            </td>
            <td className="n">
              {isNothing(unbalance, system)
                ? '–'
                : quantityText((unbalance.angle + 2 * Math.PI) % (2 * Math.PI), 'angle', system)}
            </td>
            <td className="n">
              {permissible === null ? (
                '–'
              ) : (
                <Pressed behind={behind?.permissible} text={quantityText(permissible, 'unbalance', system)} />
              )}
            </td>
            <td>
              {permissible === null ? null : unbalance.size <= permissible ? (
                'in limit'
              ) : (
                <span className="beyond">out of limit</span>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

const Pressed = ({ behind, text }: { behind?: Behind; text: string }) =>
  behind ? <BehindFigure behind={behind}>{text}</BehindFigure> : text
