'use client'

import { Fragment, memo, useEffect, useId, useRef } from 'react'
import { formatNumber } from '@/lib/units/format'
import { buildFiringMarkers, burnOf, fillFiringMarkers } from '@/scene/frame/firing-markers'
import { NARROW, type StripChain, type StripLayout } from '@/scene/frame/strip-layout'
import type { Clock } from '@/scene/session/clock'
import { steady } from '@/scene/stage/steady'
import type { Forces } from '@/scene/stage/types'
import { BankHatch } from './bank-hatch'

/** Pressures over the cycle, to stand on the lanes: by cylinder. */
export interface StripPressures {
  angleDeg: ArrayLike<number>
  pressureBar: Record<string, ArrayLike<number> | undefined>
}

interface Props {
  layout: StripLayout
  width: number
  cycleDeg: number
  clock: Clock
  forces: Pick<Forces, 'events' | 'plan'>
  pressures: StripPressures | null
}

const diamond = (x: number, y: number) => `M${x} ${y - 4.6}L${x + 4.6} ${y}L${x} ${y + 4.6}L${x - 4.6} ${y}Z`
const interval = (value: number) =>
  formatNumber(Number(value.toFixed(1)), { decimals: Math.abs(value - Math.round(value)) < 0.05 ? 0 : 1 })

/** What stands still on the strip; only the mark of the cylinder that fires now changes, by reference. */
export const StripDrawing = memo(function StripDrawing(props: Props) {
  const { layout, width, cycleDeg, clock, forces, pressures } = props
  const id = useId()
  const marks = useRef(new Map<string, SVGPathElement>())
  const { left, right, rule, groups, collectors, narrow } = layout
  const x = (angle: number) => left + (angle / cycleDeg) * (right - left)

  useEffect(() => {
    const { events, plan } = forces
    const { cylinders, cycle, gas } = plan.train
    const firing = buildFiringMarkers(cylinders.length)
    const burn = burnOf(gas)
    const show = () => {
      const steadily = steady(clock, events)
      fillFiringMarkers(firing, events, cycle, burn, clock.angle)
      for (let i = 0; i < cylinders.length; i++)
        marks.current.get(cylinders[i].id)?.classList.toggle('now', !steadily && firing.burning[i] === 1)
    }
    show()
    return clock.subscribe(show)
  }, [clock, forces])

  const quarter = cycleDeg / 8
  const labels = width < NARROW ? 4 : 8
  const fine = cycleDeg / 72
  const ticks = Array.from(
    { length: 73 },
    (_, i) => `M${x(i * fine).toFixed(1)} ${rule}v${i % 9 === 0 ? 9 : i % 3 === 0 ? 6 : 3.2}`,
  )

  return (
    <svg className="strip-svg" width={width} height={layout.height} aria-hidden="true">
      <defs>
        {groups.map((group) => (
          <BankHatch key={group.bank} id={`${id}${group.index}`} index={group.index} />
        ))}
      </defs>
      {groups.map((group) => (
        <g key={group.bank}>
          {group.lanes.map(({ cylinder, y, fires }) => (
            <Fragment key={cylinder}>
              <path className="lane" d={`M${left} ${y}L${right} ${y}`} />
              <Pressure pressures={pressures} cylinder={cylinder} x={x} y={y} cycleDeg={cycleDeg} />
              <path
                ref={(element) => {
                  if (element) marks.current.set(cylinder, element)
                  else marks.current.delete(cylinder)
                }}
                className="fire"
                d={diamond(x(fires), y - 4.7)}
              />
              {fires < cycleDeg * 0.02 ? (
                <path className="fire ghost" d={diamond(x(fires + cycleDeg), y - 4.7)} />
              ) : null}
              <text className="t fig lanen" x={left - 8} y={y - 1} textAnchor="end">
                {cylinder}
              </text>
            </Fragment>
          ))}
          {group.chain ? <Chain chain={group.chain} x={x} cycleDeg={cycleDeg} /> : null}
          <path
            className="gbr"
            d={`M${left - (narrow ? 22 : 26)} ${group.top}h-4v${group.bottom - group.top}h4`}
          />
          {narrow ? (
            <text className="t bankl" x={8} y={(group.top + group.bottom) / 2 + 6}>
              {group.bank}
            </text>
          ) : group.bank === '' ? null : (
            <>
              <rect
                className="sw"
                x={6}
                y={group.top}
                width={22}
                height={22}
                style={{ fill: `url(#${id}${group.index})` }}
              />
              <text className="t bankl" x={36} y={group.top + 15}>
                {group.bank}
              </text>
              {group.collector && group.bottom - group.top > 34 ? (
                <text className="t sm soft" x={6} y={group.top + 39}>
                  collector {group.collector}
                </text>
              ) : null}
            </>
          )}
        </g>
      ))}
      {collectors.map(({ id: name, members, chain }) => (
        <g key={name}>
          <text className="t sm soft" x={6} y={chain.y + 4}>
            {narrow ? name : `${name}: ${members}`.slice(0, 15)}
          </text>
          <Chain chain={chain} x={x} cycleDeg={cycleDeg} />
        </g>
      ))}
      <path className="d-mid" d={`M${left} ${rule}H${right}`} />
      <path className="rt" d={ticks.join('')} />
      {Array.from({ length: labels + 1 }, (_, i) => (i * 8) / labels).map((n) => (
        <text key={n} className="t fig sm" x={x(n * quarter)} y={rule + 20} textAnchor="middle">
          {n * quarter}
          {n === 0 || n === 8 ? '°' : ''}
        </text>
      ))}
    </svg>
  )
})

/** Chain dimensions between the events of one group, the last span wrapping round the end of the rule. */
function Chain({
  chain,
  x,
  cycleDeg,
}: {
  chain: StripChain
  x: (angle: number) => number
  cycleDeg: number
}) {
  const { y, at, spans } = chain
  const tick = (angle: number) => `M${(x(angle) - 3).toFixed(1)} ${y + 3}l6 -6`
  const first = at[0]
  return (
    <>
      {at.map((angle, i) => {
        const end = Math.min(angle + spans[i], cycleDeg)
        const [from, to] = [x(angle), x(end)]
        const middle = (from + to) / 2
        const text = interval(spans[i])
        const half = 4 + 3.4 * text.length
        const fits = to - from > 2 * half + 4
        return (
          <Fragment key={`${angle}-${i}`}>
            <path
              className="chd"
              d={fits ? `M${from} ${y}H${middle - half}M${middle + half} ${y}H${to}` : `M${from} ${y}H${to}`}
            />
            {fits ? (
              <text className="t fig chn" x={middle} y={y + 3.8} textAnchor="middle">
                {text}
              </text>
            ) : null}
          </Fragment>
        )
      })}
      {first > 0 ? <path className="chd" d={`M${x(0)} ${y}H${x(first)}`} /> : null}
      <path className="cht" d={at.map(tick).join('') + (first < 0.05 ? tick(cycleDeg) : '')} />
    </>
  )
}

function Pressure({
  pressures,
  cylinder,
  x,
  y,
  cycleDeg,
}: {
  pressures: StripPressures | null
  cylinder: string
  x: (angle: number) => number
  y: number
  cycleDeg: number
}) {
  const bars = pressures?.pressureBar[cylinder]
  if (!pressures || !bars) return null
  return <path className="trace gas" d={pressurePath(pressures.angleDeg, bars, x, y, cycleDeg)} />
}

/** The pressure over one lane, drawn only where it stands above the crankcase. */
function pressurePath(
  angles: ArrayLike<number>,
  pressures: ArrayLike<number>,
  x: (angle: number) => number,
  y: number,
  cycleDeg: number,
): string {
  let peak = 0
  for (let i = 0; i < pressures.length; i++) if (pressures[i] > peak) peak = pressures[i]
  const floor = 1.4
  if (peak < 2 * floor) return ''
  const height = (pressure: number) => y - 1 - ((pressure - floor) / (peak - floor)) * 9.5
  let path = ''
  let pen = false
  const stride = Math.max(1, Math.round(pressures.length / 360))
  for (let i = 0; i < pressures.length; i += stride) {
    if (pressures[i] < floor) {
      pen = false
      continue
    }
    path += `${pen ? 'L' : 'M'}${x(angles[i]).toFixed(1)} ${height(pressures[i]).toFixed(1)}`
    pen = true
  }
  return pen && pressures[0] >= floor
    ? `${path}L${x(cycleDeg).toFixed(1)} ${height(pressures[0]).toFixed(1)}`
    : path
}
