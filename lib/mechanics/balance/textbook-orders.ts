import type { Complex } from '@/lib/numerics/fourier'
import { massSplit } from '../balance'
import { crankUnbalances } from '../crank-unbalance'
import type { Train } from '../train'
import { firstTerm } from './inertia-scale'
import { complex, nothing, plus, scaled } from './phasor'
import { balanceOrders, turning, type BalanceOrder, type OrderTurning } from './turning'

/**
 * Orders of force and couple as the textbooks have them, at 1 rad/s (kg m, kg m²): each cylinder's first term
 * F_N·cos N(θ + φ − β) along its own axis is (F_N/2)·e^(i(Nφ − (N − 1)β)) forward and (F_N/2)·e^(i(−Nφ + (N + 1)β))
 * backward (direct and reverse cranks); couples with z from the reference place. The rod is two masses, offsets and link
 * rods' knuckles are left out; throws, big ends and counterweights turn forward in order 1, balance shafts in their own.
 */
export const textbookOrders = (train: Train): OrderTurning[] =>
  balanceOrders.map((order) => textbookOrder(train, order))

interface Share {
  axial: number
  forward: Complex
  backward: Complex
}

function textbookOrder(train: Train, order: BalanceOrder): OrderTurning {
  const shares = [
    ...pistons(train, order),
    ...shafts(train, order),
    ...(order === 1 ? turningWithCrank(train) : []),
  ]
  const sum = (part: 'forward' | 'backward', arm: (axial: number) => number) =>
    shares.reduce((total, share) => plus(total, scaled(share[part], arm(share.axial))), nothing)
  const whole = () => 1
  const lever = (axial: number) => axial - train.referenceAxial
  return {
    order,
    force: turning(sum('forward', whole), sum('backward', whole)),
    couple: turning(sum('forward', lever), sum('backward', lever)),
  }
}

const pistons = (train: Train, n: BalanceOrder): Share[] =>
  train.cylinders.map((cylinder) => {
    const { angle: pin, radius } = train.throws[cylinder.throw]
    const bank = train.banks[cylinder.bank].angle
    const half = (massSplit(cylinder).reciprocating * radius * firstTerm(n, radius / cylinder.rodLength)) / 2
    return {
      axial: cylinder.axial,
      forward: complex({ size: half, angle: n * pin - (n - 1) * bank }),
      backward: complex({ size: half, angle: -n * pin + (n + 1) * bank }),
    }
  })

const turningWithCrank = (train: Train): Share[] => [
  ...crankUnbalances(train).map(({ axial, angle, unbalance }) => forwards(axial, unbalance, angle)),
  ...train.cylinders.map((cylinder) => {
    const { angle, radius } = train.throws[cylinder.throw]
    return forwards(cylinder.axial, massSplit(cylinder).rotating * radius, angle)
  }),
]

const forwards = (axial: number, size: number, angle: number): Share => ({
  axial,
  forward: complex({ size, angle }),
  backward: nothing,
})

const shafts = (train: Train, order: BalanceOrder): Share[] =>
  train.balanceShafts
    .filter(({ speedRatio }) => Math.abs(speedRatio) === order)
    .map(({ axial, angle, unbalance, speedRatio }) => {
      const turned = complex({ size: unbalance * speedRatio ** 2, angle })
      const ahead = speedRatio > 0
      return { axial, forward: ahead ? turned : nothing, backward: ahead ? nothing : turned }
    })

/** The reciprocating masses alone, as a balancing table has them: no rod but its share, no offset, nothing that turns. */
export const reciprocatingAlone = (train: Train): Train => ({
  ...train,
  throws: train.throws.map((pin) => ({ ...pin, unbalance: 0 })),
  cylinders: train.cylinders.map((cylinder) => ({
    ...cylinder,
    pistonMass: massSplit(cylinder).reciprocating,
    bigEndBearing: 0,
    rod: { ...cylinder.rod, mass: 0, inertia: 0 },
  })),
  counterweights: [],
  balanceShafts: [],
  gas: { model: 'none' },
})
