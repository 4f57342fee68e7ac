import { formatNumber } from '@/lib/units/format'
import { stripLayout, type StripChain } from '@/scene/frame/strip-layout'
import type { CrankTrain } from '@/scene/model/crank-train'
import { diamond, path, type Drawing, type Mark } from './marks'

interface Input {
  train: CrankTrain
  events: { id: string; at: number }[]
  cycleDeg: number
  width: number
}

const degrees = (value: number) => formatNumber(Number(value.toFixed(1)), { decimals: 1 }).replace(/\.0$/, '')

/** The firing strip on paper: a lane a cylinder, chain dimensions for the intervals, a steel rule below. */
export function firingDrawing(input: Input): Drawing {
  const { train, events, cycleDeg, width } = input
  const layout = stripLayout(input)
  const { left, right, rule, height, groups, collectors } = layout
  const x = (angle: number) => left + (angle / cycleDeg) * (right - left)
  const text = (
    at: number,
    y: number,
    words: string,
    anchor: 'start' | 'middle' | 'end',
    size = 8,
  ): Mark => ({
    kind: 'text',
    x: at,
    y,
    text: words,
    size,
    anchor,
  })
  const marks: Mark[] = []
  for (const { lanes, bank, top, bottom, collector, chain } of groups) {
    for (const { cylinder, y, fires } of lanes) {
      marks.push({ kind: 'path', d: path('M', left, y, 'H', right), weight: 0.4 })
      marks.push({ kind: 'path', d: diamond(x(fires), y - 4.7, 4.2), weight: 0.6, fill: 'ink' })
      if (fires < 0.02 * cycleDeg)
        marks.push({
          kind: 'path',
          d: diamond(x(fires + cycleDeg), y - 4.7, 4.2),
          weight: 0.6,
          fill: 'paper',
        })
      marks.push(text(left - 8, y - 1, cylinder, 'end'))
    }
    marks.push({
      kind: 'path',
      d: path('M', left - 26, top, 'h', -4, 'v', bottom - top, 'h', 4),
      weight: 0.8,
    })
    if (bank !== '') marks.push(text(6, top + 12, `Bank ${bank}`, 'start', 9))
    if (collector !== null && bottom - top > 26)
      marks.push(text(6, top + 24, `collector ${collector}`, 'start', 7))
    if (chain) marks.push(...chainMarks(chain, x, cycleDeg))
  }
  for (const { id, chain } of collectors)
    marks.push(text(6, chain.y + 3, id, 'start', 7), ...chainMarks(chain, x, cycleDeg))
  const each = cycleDeg / 72
  const tick = (i: number) => path('M', x(i * each), rule, 'v', i % 9 === 0 ? 9 : i % 3 === 0 ? 6 : 3.2)
  marks.push(
    { kind: 'path', d: path('M', left, rule, 'H', right), weight: 1.1 },
    { kind: 'path', d: Array.from({ length: 73 }, (_, i) => tick(i)).join(' '), weight: 0.5 },
    ...Array.from({ length: 9 }, (_, i) =>
      text(x((i * cycleDeg) / 8), rule + 19, `${(i * cycleDeg) / 8}${i % 8 === 0 ? '°' : ''}`, 'middle'),
    ),
  )
  const listed = events.map(({ id, at }) => `${id} at ${degrees(at)}°`)
  return {
    width,
    height,
    words: `Firing over ${cycleDeg}°: cylinder ${listed.join(', ')}. ${orderWords(train)}`,
    marks,
  }
}

const orderWords = ({ firingOrder }: CrankTrain) => `Order ${firingOrder.join('-')}.`

function chainMarks({ y, at, spans }: StripChain, x: (angle: number) => number, cycleDeg: number): Mark[] {
  const marks: Mark[] = at.flatMap((angle, i): Mark[] => {
    const [from, to] = [x(angle), x(Math.min(angle + spans[i], cycleDeg))]
    const words = degrees(spans[i])
    const half = 4 + 2.6 * words.length
    const fits = to - from > 2 * half + 4
    const middle = (from + to) / 2
    const line = fits
      ? path('M', from, y, 'H', middle - half, 'M', middle + half, y, 'H', to)
      : path('M', from, y, 'H', to)
    return [
      { kind: 'path', d: line, weight: 0.5 },
      ...(fits
        ? [{ kind: 'text', x: middle, y: y + 3, text: words, size: 8, anchor: 'middle' } satisfies Mark]
        : []),
    ]
  })
  const ticks = [...at, ...(at[0] < 0.05 ? [cycleDeg] : [])].map((angle) =>
    path('M', x(angle) - 3, y + 3, 'l', 6, -6),
  )
  if (at[0] > 0.05) marks.push({ kind: 'path', d: path('M', x(0), y, 'H', x(at[0])), weight: 0.5 })
  return [...marks, { kind: 'path', d: ticks.join(' '), weight: 0.8 }]
}
