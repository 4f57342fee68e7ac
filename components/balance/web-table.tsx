'use client'

import { BehindFigure } from '@/components/figures/behind'
import type { WebLoad, WebRoom } from '@/lib/mechanics/balance/half-disc'
import { formatNumber } from '@/lib/units/format'
import { useSessionState } from '@/scene/session/react'
import { DocumentField, FieldRefusal } from '@/components/figures/document-field'
import { webFields } from './web-fields'

const heads = ['axial', 'moment', 'angle', 'radius', 'mass'] as const

interface Props {
  loads: WebLoad[]
  room: WebRoom
  chosen: number
  onChoose(index: number): void
  stays: ReadonlySet<string>
  onStays(id: string, stays: boolean): void
}

/** The counterweights, a web at a time: each figure can be typed. */
export function WebTable({ loads, room, chosen, onChoose, stays, onStays }: Props) {
  const scene = useSessionState((state) => state.scene)
  const system = useSessionState((state) => state.system)
  const weights = scene.train.counterweights
  const columns = webFields(0)
  return (
    <>
      <div className="web-table" tabIndex={0} role="region" aria-label="Counterweights">
        <table className="tab">
          <thead>
            <tr>
              <th scope="col">Web</th>
              {heads.map((head) => (
                <th key={head} scope="col" className="r">
                  {columns[head].label} <span className="u">{columns[head].show(scene, system).unit}</span>
                </th>
              ))}
              <th scope="col" className="r">
                Of what it holds
              </th>
              <th scope="col">Stays</th>
            </tr>
          </thead>
          <tbody>
            {weights.map(({ id }, index) => {
              const fields = webFields(index)
              return (
                <tr key={id} className={index === chosen ? 'on' : undefined}>
                  <th scope="row">
                    <button
                      type="button"
                      className="row-button"
                      aria-pressed={index === chosen}
                      aria-label={`Show web ${id}`}
                      onClick={() => onChoose(index)}
                    >
                      {id}
                    </button>
                  </th>
                  {heads.map((head) => (
                    <td key={head} className="n">
                      <DocumentField
                        field={fields[head]}
                        cell={`${fields[head].label} of ${id}`}
                        onFocus={() => onChoose(index)}
                      />
                    </td>
                  ))}
                  <td className="n">
                    <Share load={loads[index]} id={id} room={room} />
                  </td>
                  <td>
                    <input
                      type="checkbox"
                      aria-label={`${id} stays as it is when solved`}
                      checked={stays.has(id)}
                      onChange={(event) => onStays(id, event.target.checked)}
                    />
                  </td>
                </tr>
              )
            })}
          </tbody>
        </table>
      </div>
      {weights.flatMap((_, index) =>
        Object.values(webFields(index)).map((field) => <FieldRefusal key={field.key} field={field} />),
      )}
    </>
  )
}

/** A share of the half disc; beyond it in the pencil's octagon, with the word. */
function Share({ load, id, room }: { load: WebLoad | undefined; id: string; room: WebRoom }) {
  if (!load) return '–'
  const share = load.moment / load.capacity
  const text = `${formatNumber(100 * share, { decimals: 0 })} %`
  const figure = (
    <BehindFigure
      behind={{
        figure: 'counterweight-share',
        counterweight: id,
        sizes: { webThickness: room.thickness, counterweightRadius: room.radius },
      }}
    >
      {text}
    </BehindFigure>
  )
  return load.slug ? (
    <>
      <span className="beyond">beyond</span> {figure}
    </>
  ) : (
    figure
  )
}
