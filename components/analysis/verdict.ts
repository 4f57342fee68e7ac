import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import type { Results } from '@/scene/session/results'

type Order = Results['bareOrders'][number]

/** Below this share of the inertia force of one cylinder (and that force times the crank's length) nothing is said to be left. */
const NOTHING = 0.01

interface Sizes {
  force: number
  couple: number
}

/** What one cylinder's reciprocating mass would do alone: the measure of small. */
function measure({ train, speedRpm, analysis }: Results): Sizes {
  const speed = (speedRpm * 2 * Math.PI) / 60
  const masses = Object.values(analysis.balance.cylinders).map(({ reciprocatingKg }) => reciprocatingKg)
  const mass = masses.reduce((sum, one) => sum + one, 0) / masses.length
  const force = mass * train.throws[0].radius * speed * speed
  const places = train.cylinders.map(({ axial }) => axial)
  const length = Math.max(...places) - Math.min(...places) || train.cylinders[0].bore
  return { force, couple: (force * length) / Math.max(1, train.throws.length - 1) }
}

const names: Record<number, string> = { 1: 'first', 2: 'second', 4: 'fourth' }

/** In words: what the counterweights take, and what is left to shake and why. */
export function verdict(results: Results, system: System): string[] {
  const { analysis, bareOrders } = results
  if (results.speedRpm === 0) return ['Standing still: no inertia forces.']
  const small = measure(results)
  const at = (orders: Order[], order: number) => orders.find((one) => one.order === order)
  const sentences: string[] = []
  const bare = at(bareOrders, 1)
  const first = at(analysis.orders, 1)
  const hasWeights = results.train.counterweights.length > 0 || results.train.balanceShafts.length > 0
  if (bare && first && hasWeights)
    for (const kind of ['force', 'couple'] as const) {
      const [forward, backward] = partsOf(bare, kind)
      const left = partsOf(first, kind)[0]
      const limit = NOTHING * small[kind]
      if (forward <= limit) continue
      if (backward <= limit)
        sentences.push(
          left <= limit
            ? `The bare crank’s ${kind} only turns forward: the counterweights take all of it.`
            : `The bare crank’s ${kind} only turns forward: counterweights could take all of it, and ${sizeText(left, kind, system)} is left.`,
        )
      else if (left <= limit)
        sentences.push(
          `The counterweights take the whole forward ${kind}; what turns backward is out of their reach.`,
        )
    }
  const left = [1, 2, 4].flatMap((order) => {
    const one = at(analysis.orders, order)
    if (!one) return []
    return (['force', 'couple'] as const).flatMap((kind) => {
      const sum = partsOf(one, kind)[0] + partsOf(one, kind)[1]
      return sum > NOTHING * small[kind] * (order === 4 ? 2 : 1)
        ? [`a ${names[order]}-order ${kind} of up to ${sizeText(sum, kind, system)}`]
        : []
    })
  })
  if (left.length === 0) sentences.push('Nothing worth naming is left in the first, second or fourth order.')
  else sentences.push(`Left to shake: ${list(left)}.`)
  return sentences
}

const partsOf = (order: Order, kind: 'force' | 'couple'): [number, number] =>
  kind === 'force' ? [order.forwardN, order.backwardN] : [order.forwardNm, order.backwardNm]
const sizeText = (value: number, kind: 'force' | 'couple', system: System) =>
  quantityText(value, kind === 'force' ? 'force' : 'torque', system)
const list = (parts: string[]) =>
  parts.length === 1 ? parts[0] : `${parts.slice(0, -1).join(', ')} and ${parts[parts.length - 1]}`
