import { useTyped } from '@/components/figures/use-typed'
import { phasor } from '@/lib/mechanics/balance/phasor'
import { bearingPlanes, residualInPlanes } from '@/lib/mechanics/balance/two-planes'
import type { residualUnbalance } from '@/lib/mechanics/balance'
import { useResults, useSessionState } from '@/scene/session/react'

/** Two places along the crank, typed or the outermost bearings; m. */
export function usePlanes() {
  const { train } = useResults()
  const system = useSessionState((state) => state.system)
  const [a, b] = bearingPlanes(train) ?? [undefined, undefined]
  const near = useTyped('length', system, a, () => null)
  const far = useTyped('length', system, b, () => null)
  const places =
    near.value === undefined || far.value === undefined || near.value === far.value
      ? null
      : ([near.value, far.value] as const)
  return { near, far, places }
}

/** The residual as it shows in two planes. */
export const shownIn = (
  residual: ReturnType<typeof residualUnbalance>,
  [a, b]: readonly [number, number],
  reference: number,
) => residualInPlanes(residual, a - reference, b - reference).map(phasor)
