import type { CrankTrain } from '@/scene/model/crank-train'
import { circle, path, type Drawing, type Mark } from './marks'

const width = 260
const height = 200
const pinAt = 62
const pinRadius = 11

/** 2 before 10. */
export const byNumber = (one: string, other: string) => one.localeCompare(other, 'en', { numeric: true })

/** Pins at one angle are one spoke: their names, and the cylinders on them. */
function spokes({ throws, cylinders }: CrankTrain) {
  const found = new Map<number, { throws: string[]; cylinders: string[] }>()
  for (const pin of throws) {
    const angle = Math.round((((pin.angleDeg % 360) + 360) % 360) * 100) / 100
    const spoke = found.get(angle) ?? { throws: [], cylinders: [] }
    spoke.throws.push(pin.id)
    spoke.cylinders.push(...cylinders.filter((cylinder) => cylinder.throw === pin.id).map(({ id }) => id))
    spoke.cylinders.sort(byNumber)
    found.set(angle, spoke)
  }
  return [...found].map(([angle, spoke]) => ({ angle, ...spoke })).sort((a, b) => a.angle - b.angle)
}

/** The crank seen from the free end: every pin a spoke with its name and cylinders, banks as ticks, the way it turns. */
export function crankStar(document: CrankTrain): Drawing {
  const clockwise = document.rotation === 'clockwise'
  const at = (angleDeg: number, radius: number): [number, number] => {
    const angle = (angleDeg * Math.PI) / 180
    return [
      width / 2 + (clockwise ? 1 : -1) * radius * Math.sin(angle),
      height / 2 - radius * Math.cos(angle),
    ]
  }
  const line = (angleDeg: number, from: number, to: number, weight: number, dash?: number[]): Mark => ({
    kind: 'path',
    d: path('M', ...at(angleDeg, from), 'L', ...at(angleDeg, to)),
    weight,
    dash,
  })
  const text = (angleDeg: number, radius: number, words: string, height: number): Mark => {
    const [x, y] = at(angleDeg, radius)
    return { kind: 'text', x, y: y + 0.35 * height, text: words, size: height, anchor: 'middle' }
  }
  const pins = spokes(document)
  const marks: Mark[] = [
    { kind: 'path', d: circle(width / 2, height / 2, pinAt), weight: 0.6, dash: [6, 3, 1.5, 3] },
    { kind: 'path', d: circle(width / 2, height / 2, 4), weight: 0.8, fill: 'paper' },
    ...document.banks.map((bank) => line(bank.angleDeg, 14, 38, 0.6, [4, 2])),
    ...document.banks.map((bank) => text(bank.angleDeg, 44, bank.id, 8)),
    ...pins.flatMap(({ angle, throws, cylinders }): Mark[] => [
      line(angle, 5, pinAt - pinRadius, 1.8),
      { kind: 'path', d: circle(...at(angle, pinAt), pinRadius), weight: 1.2, fill: 'paper' },
      text(angle, pinAt, throws.join(' '), throws.join(' ').length > 3 ? 6 : 8),
      ...(cylinders.length > 0 ? [beyond(at(angle, pinAt), cylinders.join('-'))] : []),
    ]),
    ...turning(at),
  ]
  const listed = pins.map(({ angle, throws, cylinders }) => {
    const carried = cylinders.length > 0 ? `, cylinders ${cylinders.join(', ')}` : ''
    return `pin ${throws.join(' and ')} at ${angle}°${carried}`
  })
  return {
    width,
    height,
    words: `Crank star seen from the free end, turning ${document.rotation}: ${listed.join('; ')}.`,
    marks,
  }
}

/** Words outside a pin: beside it where it stands to the side, else over or under it. */
function beyond([x, y]: [number, number], text: string): Mark {
  const side = (x - width / 2) / pinAt
  const label = { kind: 'text', text, size: 8 } as const
  if (Math.abs(side) < 0.4)
    return { ...label, x, y: y < height / 2 ? y - pinRadius - 5 : y + pinRadius + 11, anchor: 'middle' }
  return {
    ...label,
    x: x + Math.sign(side) * (pinRadius + 4),
    y: y + 3,
    anchor: side > 0 ? 'start' : 'end',
  }
}

/** An arc at the centre with an arrow head, the way the crank turns. */
function turning(at: (angleDeg: number, radius: number) => [number, number]): Mark[] {
  const arc = Array.from({ length: 13 }, (_, i) => at(112 + 4 * i, 26))
  return [
    { kind: 'path', d: path(...arc.flatMap((point, i) => [i ? 'L' : 'M', ...point])), weight: 0.8 },
    {
      kind: 'path',
      d: path('M', ...at(158, 22.5), 'L', ...at(172, 26), 'L', ...at(158, 29.5), 'Z'),
      weight: 0.4,
      fill: 'ink',
    },
  ]
}
