import type { Train } from '../train'
import { inertiaScale } from './inertia-scale'
import type { OrderTurning, Turning } from './turning'

/**
 * What each remedy can remove: counterweights what turns with the crank in order 1; a shaft at crank speed against it,
 * what turns backward; shafts at twice the speed, order 2. (Direct and reverse cranks; any text on engine balancing.)
 */
export type Remedy = 'counterweights' | 'counter-turning shaft' | 'shafts at twice the speed'

export interface VerdictPart {
  remedy: Remedy
  kind: 'force' | 'couple'
  /** Of the bare crank, and of the engine as it stands: N or N m, at 1 rad/s kg m or kg m². */
  bare: number
  left: number
}

/** Below this share of one cylinder's first-order force (and of that times the crank's length) nothing is said to shake. */
const SMALL = 0.01

/** The forces and couples worth naming, of the bare crank or of the engine as it stands; orders at `speed`, rad/s. */
export function balanceVerdict(
  train: Train,
  bare: readonly OrderTurning[],
  now: readonly OrderTurning[],
  speed = 1,
): VerdictPart[] {
  const force = inertiaScale(train).force * speed ** 2
  const places = train.cylinders.map(({ axial }) => axial)
  const length = Math.max(...places) - Math.min(...places) || train.cylinders[0].bore
  const small = {
    force: SMALL * force,
    couple: (SMALL * force * length) / Math.max(1, train.throws.length - 1),
  }
  const find = (orders: readonly OrderTurning[], order: number) => orders.find((one) => one.order === order)
  return remedies.flatMap(({ remedy, order, size }) =>
    (['force', 'couple'] as const).flatMap((kind) => {
      const [before, after] = [find(bare, order), find(now, order)]
      if (!before || !after) return []
      const part = { remedy, kind, bare: size(before[kind]), left: size(after[kind]) }
      const named = Math.max(part.bare, part.left) > small[kind]
      return named ? [{ ...part, left: part.left > small[kind] ? part.left : 0 }] : []
    }),
  )
}

const remedies: { remedy: Remedy; order: number; size(part: Turning): number }[] = [
  { remedy: 'counterweights', order: 1, size: ({ forward }) => forward.size },
  { remedy: 'counter-turning shaft', order: 1, size: ({ backward }) => backward.size },
  { remedy: 'shafts at twice the speed', order: 2, size: ({ major }) => major },
]
