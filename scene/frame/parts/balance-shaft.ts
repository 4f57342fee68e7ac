import { addLathe, tubeProfile } from '../mesh/lathe'
import type { MeshBuilder } from '../mesh/mesh-builder'
import { arc } from '../mesh/outline'
import { addPrism } from '../mesh/prism'
import type { Room } from '../room'
import { STEEL } from '../shape'

interface BalanceShaftSize {
  length: number
  radius: number
}

/** The half-round weight of this unbalance: U = ρ·L·(2/3)·R³ with length L = 3·R (common practice). */
function balanceShaftSize(unbalance: number): BalanceShaftSize {
  const radius = Math.max(unbalance / (2 * STEEL), 1e-9) ** 0.25
  return { radius, length: 3 * radius }
}

/** Heavy side along +y; the middle of the weight is at z 0. */
function addBalanceShaft(builder: MeshBuilder, { length, radius }: BalanceShaftSize) {
  const spindle = 0.36 * radius
  const half = length / 2
  addLathe(builder, {
    profile: tubeProfile(0, spindle, -half - 1.6 * spindle, half + 1.6 * spindle),
    axis: 'z',
    steps: 28,
  })
  addPrism(builder, {
    outline: [...arc(0, 0, radius, 0, Math.PI), ...arc(0, 0, 0.9 * spindle, Math.PI, 0)],
    from: -half,
    to: half,
  })
}

export function addBalanceShafts({ parts, train, mirror }: Room) {
  train.balanceShafts.forEach(({ id, unbalance, axial, angle, speedRatio, horizontal, vertical }, shaft) => {
    const size = balanceShaftSize(unbalance)
    const mesh = parts.mesh(`shaft ${size.radius}`, axial, (builder) => addBalanceShaft(builder, size))
    const named = {
      id: `balance-shaft:${id}`,
      kind: 'balance-shaft',
      group: 'shafts',
      body: parts.newBody(),
      motion: { kind: 'shaft', shaft },
      label: `Balance shaft ${id}`,
    } as const
    parts.add(named, mesh, { phase: angle, ratio: speedRatio, x: mirror * horizontal, y: vertical })
  })
}
