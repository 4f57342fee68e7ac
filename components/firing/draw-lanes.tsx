import { Fragment } from 'react'
import { angleWord } from '@/components/figures/interval-words'
import type { Drawn } from '@/components/ui/charts/types'
import type { PulseWindow } from '@/lib/mechanics/exhaust-pulses'
import { fromSi } from '@/lib/units/units'
import type { LaneGroup } from './pulse-words'
import { wholeSpans, type Span } from './window-spans'

interface Drawing {
  id: string
  width: number
  lanes: readonly LaneGroup[]
  window: PulseWindow
  cycle: number
}

const LANE = 18
const BAR = 10
const TOP = 6
const BETWEEN = 12

/** A lane a cylinder, a bar from exhaust opening on, hatched where another bar of the collector lies over it. */
export function drawLanes({ id, width, lanes, window, cycle }: Drawing): Drawn {
  const left = width < 400 ? 40 : 128
  const [right, cycleDeg, length] = [width - 14, fromSi(cycle, '°'), fromSi(window.length, '°')]
  const x = (angle: number) => left + (angle / cycleDeg) * (right - left)
  const rects = (spans: Span[], y: number, className: string, style?: React.CSSProperties) =>
    spans.map(({ from, to }) => (
      <rect
        key={`${className} ${from}`}
        className={className}
        style={style}
        x={x(from)}
        y={y}
        width={Math.max(1, x(to) - x(from))}
        height={BAR}
      />
    ))
  const places: { x: number; y: number; words: string }[] = []
  let y = TOP
  const picture = lanes.map((lane) => {
    const top = y
    const rows = lane.pulses.map((pulse, place) => {
      const bar = y
      y += LANE
      const others = lane.pulses.filter((_, index) => index !== place).map(({ opens }) => opens)
      const spans = wholeSpans(pulse.opens, others, length, cycleDeg)
      places.push({
        x: x(pulse.opens),
        y: bar + BAR / 2,
        words: `${lane.name}, cylinder ${pulse.cylinder}: opens ${angleWord(pulse.opens)}°, ${angleWord(pulse.gap)}° after the last, overlap ${angleWord(pulse.overlap)}°`,
      })
      return (
        <Fragment key={pulse.cylinder}>
          <path className="lane" d={`M${left} ${bar + BAR}H${right}`} />
          {rects(spans.own, bar, 'pulse-window')}
          {rects(spans.shared, bar, 'pulse-shared', { fill: `url(#${id}-shared)` })}
          <text className="t fig lanen" x={left - 8} y={bar + BAR - 1} textAnchor="end">
            {pulse.cylinder}
          </text>
        </Fragment>
      )
    })
    const group = (
      <g key={lane.name}>
        {rows}
        <path className="gbr" d={`M${left - 26} ${top}h-4v${y - top - 6}h4`} />
        <text className="t sm" x={2} y={top + (y - top) / 2}>
          {width < 400 ? lane.name.split(' ').at(-1) : lane.name}
        </text>
      </g>
    )
    y += BETWEEN
    return group
  })
  const rule = y
  const parts = width < 400 ? 4 : 8
  return {
    height: rule + 38,
    picture: (
      <>
        <defs>
          <pattern
            id={`${id}-shared`}
            className="hatch"
            width="5"
            height="5"
            patternUnits="userSpaceOnUse"
            patternTransform="rotate(45)"
          >
            <path d="M0 2.5H5" />
          </pattern>
        </defs>
        {picture}
        <path className="d-mid" d={`M${left} ${rule}H${right}`} />
        {Array.from({ length: parts + 1 }, (_, i) => (i * cycleDeg) / parts).map((angle) => (
          <Fragment key={angle}>
            <path className="rt" d={`M${x(angle)} ${rule}v7`} />
            <text className="t fig xs" x={x(angle)} y={rule + 20} textAnchor="middle">
              {angleWord(angle)}
              {angle === 0 || angle === cycleDeg ? '°' : ''}
            </text>
          </Fragment>
        ))}
        <text className="t xs" x={right} y={rule + 34} textAnchor="end">
          Crank angle, °
        </text>
      </>
    ),
    points: { count: places.length, place: (index) => places[index], words: (index) => places[index].words },
  }
}
