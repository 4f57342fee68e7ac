import { NEAR, type CriticalSpeed, type RunningRange } from '@/lib/mechanics/torsion/critical-speeds'
import { formatNumber } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import { missingWords } from '@/scene/frame/torsion-words'
import { orderText } from './order-text'

/** A critical speed with what the cylinders put into it. */
export interface Critical extends CriticalSpeed {
  vectorSum: number
}

export const rpmText = (speed: number): string => formatNumber(fromSi(speed, 'rpm'), { decimals: 0 })

/** Where a critical lies, by shape and by word. */
export const placeWords = (place: CriticalSpeed['place']): string =>
  place === null ? '–' : { inside: '◆ in the range', near: '◇ near it', outside: 'outside' }[place]

const isMet = ({ place }: CriticalSpeed) => place === 'inside' || place === 'near'

/** In their order, but those in or near the running range before the others. */
export const metFirst = (criticals: readonly Critical[]): Critical[] => [
  ...criticals.filter(isMet),
  ...criticals.filter((one) => !isMet(one)),
]

/** Those in or near the running range, the ones the cylinders feed most first. */
export const strongest = (criticals: readonly Critical[]): Critical[] =>
  criticals.filter(isMet).sort((a, b) => b.vectorSum - a.vectorSum)

/** Those that can be told apart on an axis: none nearer than `apart` (rad/s) to an earlier one of the same mode. */
export const spaced = (criticals: readonly Critical[], apart: number): Critical[] =>
  criticals.reduce<Critical[]>(
    (kept, one) =>
      kept.some(({ mode, speed }) => mode === one.mode && Math.abs(speed - one.speed) < apart)
        ? kept
        : [...kept, one],
    [],
  )

/** The orders worth a line: of the strongest criticals, at most `most`, ascending; the highest order where none is met. */
export function shownOrders(criticals: readonly Critical[], most: number): number[] {
  const met = [...new Set(strongest(criticals).map(({ order }) => order))].slice(0, most)
  const shown = met.length > 0 ? met : criticals.slice(-1).map(({ order }) => order)
  return shown.sort((a, b) => a - b)
}

/** How many criticals are met, and which of them the cylinders feed most. */
export function criticalsSentence(
  criticals: readonly Critical[],
  range: RunningRange | null,
  cylinders: number,
): string {
  if (!range)
    return 'Neither a maximum nor a rated speed is entered, so none can be told to be in the running range.'
  const span = `${rpmText((1 - NEAR) * range.from)} to ${rpmText((1 + NEAR) * range.to)} rpm, 0.85 of the lowest to 1.15 of the greatest running speed`
  const met = strongest(criticals)
  if (met.length === 0) return `None lies from ${span}.`
  const { order, mode, speed, vectorSum } = met[0]
  const inside = met.filter(({ place }) => place === 'inside').length
  return `${met.length} ${met.length === 1 ? 'lies' : 'lie'} from ${span}; ${inside} of them in the running range itself. By their vectors alone the cylinders feed order ${orderText(order)} with mode ${mode + 1} at ${rpmText(speed)} rpm most: they add up to ${formatNumber(vectorSum, { decimals: 2 })} of ${cylinders}.`
}

/** What must be entered before there is a figure. */
export function lackingSentence(paths: readonly string[], instead?: string): string {
  const words = paths.map(missingWords)
  const list = words.length > 1 ? `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}` : words[0]
  return `Missing: ${list}. Enter ${words.length > 1 ? 'them' : 'it'} in the parts list${instead ? `, or ${instead}` : ''}.`
}

/** Upright lines of the running speeds, those at one place under one name. */
export function speedRulers(operating: { idle?: number; rated?: number; max?: number }) {
  const rulers: { x: number; text: string }[] = []
  for (const [name, speed] of [
    ['idle', operating.idle],
    ['rated', operating.rated],
    ['max', operating.max],
  ] as const) {
    if (speed === undefined) continue
    const x = fromSi(speed, 'rpm')
    const same = rulers.find((ruler) => ruler.x === x)
    if (same) same.text += ` and ${name}`
    else rulers.push({ x, text: name })
  }
  return rulers
}
