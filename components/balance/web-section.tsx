'use client'

import { useState } from 'react'
import { BehindFigure } from '@/components/figures/behind'
import { LeafSection } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { densities, SLUG_AT, webLoad } from '@/lib/mechanics/balance/half-disc'
import { quantityText, formatNumber } from '@/lib/units/format'
import { webRoom } from '@/scene/frame/web-planes'
import { useResults, useSessionState } from '@/scene/session/react'
import { SolveBar } from './solve-bar'
import { WebTable } from './web-table'
import { WebView } from './web-view'

type Metal = keyof typeof densities
const metals: Metal[] = ['tungsten alloy, light', 'tungsten alloy', 'tungsten alloy, heavy']

/** Counterweights a web at a time: solved, typed, or drawn by their arrow. */
export function WebSection() {
  const { document, train } = useResults()
  const system = useSessionState((state) => state.system)
  const [picked, setPicked] = useState(0)
  const [stays, setStays] = useState<ReadonlySet<string>>(new Set())
  const [metal, setMetal] = useState<Metal>('tungsten alloy')
  const room = webRoom(document, train)
  const loads = train.counterweights.map((weight) => webLoad(weight, room, { density: densities[metal] }))
  const chosen = Math.min(picked, train.counterweights.length - 1)
  const beyond = train.counterweights.flatMap(({ id }, i) =>
    loads[i].slug ? [{ id, slug: loads[i].slug }] : [],
  )
  const onStays = (id: string, on: boolean) =>
    setStays((now) => (on ? new Set([...now, id]) : new Set([...now].filter((other) => other !== id))))
  const slugFigure = (figure: 'slug-volume' | 'slug-mass' | 'slug-diameter', id: string, text: string) => (
    <BehindFigure
      behind={{
        figure,
        counterweight: id,
        slugDensity: densities[metal],
        sizes: { webThickness: room.thickness, counterweightRadius: room.radius },
      }}
      label={`Slug of ${id}, ${text}`}
    >
      {text}
    </BehindFigure>
  )
  const sizes = `${quantityText(room.radius, 'length', system)} radius, ${quantityText(room.thickness, 'length', system)} thick`
  return (
    <LeafSection title="Counterweights, a web at a time" at={`webs of ${sizes}`} wide>
      <SolveBar room={room} stays={stays} />
      {chosen < 0 ? (
        <p className="read">
          This crank has no counterweights. “Balance in all webs” sets one out on each side of every throw;
          the parts list takes single ones.
        </p>
      ) : (
        <div className="web-pair">
          <div className="web-side">
            <WebTable
              loads={loads}
              room={room}
              chosen={chosen}
              onChoose={setPicked}
              stays={stays}
              onStays={onStays}
            />
            {beyond.length > 0 ? (
              <div className="slugs">
                <p className="say">
                  Beyond what a half disc of steel holds. A slug closes it, set in at{' '}
                  {quantityText(SLUG_AT * room.radius, 'length', system)} from the crank’s axis:
                </p>
                <ul>
                  {beyond.map(({ id, slug }) => (
                    <li key={id}>
                      {id}:{' '}
                      {slugFigure(
                        'slug-volume',
                        id,
                        `${formatNumber(slug.volume * 1e6, { decimals: 1 })} cm³`,
                      )}
                      , {slugFigure('slug-mass', id, quantityText(slug.mass, 'mass', system))},{' '}
                      {slugFigure('slug-diameter', id, quantityText(slug.diameter, 'length', system))} across
                      right through the web
                    </li>
                  ))}
                </ul>
                <label className="pick-label">
                  of{' '}
                  <select
                    className="pick"
                    value={metal}
                    onChange={(event) => setMetal(asMetal(event.target.value))}
                  >
                    {metals.map((name) => (
                      <option key={name} value={name}>
                        {name}, {formatNumber(densities[name], { decimals: 0 })} kg/m³
                      </option>
                    ))}
                  </select>
                </label>
              </div>
            ) : null}
            {room.stated ? null : (
              <p className="cap">
                The sheet gives no counterweight radius or web thickness: what a web holds is from proportions
                of the bore.
              </p>
            )}
            <Caution />
          </div>
          <WebView index={chosen} room={room} />
        </div>
      )}
    </LeafSection>
  )
}

const asMetal = (text: string): Metal => metals.find((name) => name === text) ?? 'tungsten alloy'
