'use client'

import { useRef, type KeyboardEvent, type PointerEvent } from 'react'
import { halfDiscMoment, type WebRoom } from '@/lib/mechanics/balance/half-disc'
import { quantityText } from '@/lib/units/format'
import { fromSi, toSi } from '@/lib/units/units'
import { inTrain } from '@/scene/session/path'
import { useBench, useResults, useSessionState } from '@/scene/session/react'

/** Half the width of the drawing, and the circle on which a weight is all that the web holds. */
const HALF = 150
const FULL = 96

/**
 * One web seen from the free end with its counterweight as an arrow: its way is the angle, its length the moment, and the
 * dashed circle what the web holds. The head can be dragged, and moved with keys.
 */
export function WebView({ index, room }: { index: number; room: WebRoom }) {
  const { session } = useBench()
  const { train, document } = useResults()
  const system = useSessionState((state) => state.system)
  const drawing = useRef<SVGSVGElement>(null)
  const gestures = useRef(0)
  const weight = train.counterweights[index]
  const capacity = halfDiscMoment(room.radius, room.thickness, room.density)
  const mirror = document.rotation === 'clockwise' ? 1 : -1
  const moment = weight.mass * weight.radius
  const pin = train.throws.reduce((near, other) =>
    Math.abs(other.axial - weight.axial) < Math.abs(near.axial - weight.axial) ? other : near,
  )
  const at = (angle: number, length: number): [number, number] => [
    mirror * Math.sin(angle) * length,
    -Math.cos(angle) * length,
  ]

  const set = (angle: number, wanted: number) => {
    if (weight.radius <= 0) return
    const momentKgMm = Math.max(0, Number(fromSi(wanted, 'kg mm').toPrecision(5)))
    const angleDeg = Number((((fromSi(angle, '°') % 360) + 360) % 360).toFixed(1))
    const path = ['counterweights', index]
    session.edit(
      inTrain([
        { path: [...path, 'massKg'], value: momentKgMm / fromSi(weight.radius, 'mm') },
        { path: [...path, 'angleDeg'], value: angleDeg },
      ]),
      `web.${index}.${gestures.current}`,
    )
  }
  const begin = () => {
    session.seal()
    gestures.current++
  }
  const onDrag = (event: PointerEvent<SVGGElement>) => {
    const box = drawing.current!.getBoundingClientRect()
    const unit = (2 * HALF) / box.width
    const x = mirror * ((event.clientX - box.left) * unit - HALF)
    const y = HALF - (event.clientY - box.top) * unit
    set(Math.atan2(x, y), (Math.min(Math.hypot(x, y), HALF) / FULL) * capacity)
  }
  const onKey = (event: KeyboardEvent) => {
    const fine = event.shiftKey ? 0.1 : 1
    const turn = { ArrowLeft: -mirror, ArrowRight: mirror }[event.key]
    const grow = { ArrowUp: 1, ArrowDown: -1, '+': 1, '=': 1, '-': -1, '−': -1 }[event.key]
    if (turn === undefined && grow === undefined) return
    event.preventDefault()
    if (!event.repeat) begin()
    set(weight.angle + toSi((turn ?? 0) * fine, '°'), moment + (grow ?? 0) * 0.01 * fine * capacity)
  }
  const shown = Math.min((moment / capacity) * FULL, HALF - 12)
  const head = at(weight.angle, shown)
  const pinAt = at(pin.angle, 0.55 * FULL)
  const words = `${quantityText(moment, 'unbalance', system)} at ${quantityText((weight.angle + 2 * Math.PI) % (2 * Math.PI), 'angle', system)}`
  return (
    <figure className="web-view">
      <svg
        ref={drawing}
        viewBox={`${-HALF} ${-HALF} ${2 * HALF} ${2 * HALF}`}
        role="group"
        aria-label={`Web ${weight.id} from the free end`}
      >
        <g aria-hidden="true">
          <path className="web-centre" d={`M${-HALF} 0H${HALF}M0 ${-HALF}V${HALF}`} />
          <circle className="web-holds" r={FULL} />
          <text className="t sm" y={-FULL - 5} textAnchor="middle">
            all it holds
          </text>
          <circle className="web-journal" r={0.3 * FULL} />
          <circle className="web-pin" cx={pinAt[0]} cy={pinAt[1]} r={0.24 * FULL} />
          <text className="t sm" x={pinAt[0]} y={pinAt[1] + 4} textAnchor="middle">
            {pin.id}
          </text>
          <path className="web-arrow" d={`M0 0L${head[0]} ${head[1]}`} />
        </g>
        <g
          className="web-handle"
          role="slider"
          tabIndex={0}
          aria-label={`Counterweight ${weight.id}: left and right turn it, up and down change its moment`}
          aria-valuemin={0}
          aria-valuemax={Math.round(fromSi(1.5 * capacity, 'g mm'))}
          aria-valuenow={Math.round(fromSi(moment, 'g mm'))}
          aria-valuetext={words}
          transform={`translate(${head[0]} ${head[1]})`}
          onKeyDown={onKey}
          onKeyUp={() => session.seal()}
          onPointerDown={(event) => {
            event.currentTarget.setPointerCapture(event.pointerId)
            begin()
          }}
          onPointerMove={(event) => {
            if (event.currentTarget.hasPointerCapture(event.pointerId)) onDrag(event)
          }}
          onPointerUp={() => session.seal()}
          onPointerCancel={() => session.seal()}
        >
          <circle className="web-reach" r={22} />
          <circle className="web-grip" r={9} />
        </g>
      </svg>
      <figcaption className="cap">
        Web {weight.id} from the free end, crank at 0°: {words}. Drag the ring; arrow keys turn it and change
        its moment, + and − too, Shift is finer.
      </figcaption>
    </figure>
  )
}
