import { describe, expect, it } from 'vitest'
import { instants, RAD_S } from '@/tests/support/mechanics/kernel'
import { runInEngine, type EngineRig } from '@/tests/support/mechanics/physics-engine'
import type { CrankTrainInput } from '@/scene/model/crank-train'

/**
 * Pin loads against the joint reactions of a general rigid-body engine (planck) that knows nothing of slider-cranks:
 * bodies, hinges and a slide, run step by step. Its steps are first-order in time, so two runs, one with half the step,
 * are extrapolated to none; what is left is below 5e-5 of the greatest reaction.
 */
const SHARE = 5e-5
const RPM = 60 / Math.PI // 2 rad/s: lengths of a few metres and forces of a few newtons suit the engine

const train = (more: object): CrankTrainInput => ({
  format: 'crank-train/1',
  cycle: 'two-stroke',
  cylinderDefaults: { boreMm: 1000, strokeMm: 2000, rodLengthMm: 3500, offsetMm: 0, compressionRatio: 10 },
  masses: { pistonKg: 1.3, rod: { massKg: 0.8, cgFromBigEndMm: 1100, inertiaKgMm2: 1.4e6 } },
  banks: [{ id: 'A', angleDeg: 0 }],
  throws: [{ id: '1', angleDeg: 0, axialMm: 0 }],
  cylinders: [{ id: '1', bank: 'A', throw: '1', axialMm: 0 }],
  firingOrder: ['1'],
  ...more,
})

const constantGas = (newtons: number) => {
  const bar = 1.01325 + newtons / (Math.PI / 4) / 1e5
  const angleDeg = Array.from({ length: 12 }, (_, i) => 30 * i - 180)
  return { model: 'trace' as const, angleDeg, pressureBar: angleDeg.map(() => bar) }
}

const cases: { name: string; document: CrankTrainInput; rig: EngineRig }[] = [
  {
    name: 'a rigid rod on its own',
    document: train({}),
    rig: { gas: 0, rods: [{ bank: 0, rod: 3.5, offset: 0, piston: 1.3, mass: 0.8, cg: 1.1, inertia: 1.4 }] },
  },
  {
    name: 'a rigid rod with an offset cylinder and gas',
    document: train({
      gas: constantGas(9),
      cylinders: [{ id: '1', bank: 'A', throw: '1', axialMm: 0, offsetMm: 300 }],
    }),
    rig: {
      gas: 9,
      rods: [{ bank: 0, rod: 3.5, offset: 0.3, piston: 1.3, mass: 0.8, cg: 1.1, inertia: 1.4 }],
    },
  },
  {
    name: 'a master rod with a link rod on it',
    document: train({
      banks: [
        { id: 'A', angleDeg: 0 },
        { id: 'B', angleDeg: 60 },
      ],
      cylinders: [
        { id: '1', bank: 'A', throw: '1', axialMm: 0 },
        {
          id: '2',
          bank: 'B',
          throw: '1',
          axialMm: 0,
          rodLengthMm: 2700,
          rod: { massKg: 0.5, cgFromBigEndMm: 1200, inertiaKgMm2: 0.5e6 },
          link: { master: '1', knuckleRadiusMm: 800, knuckleAngleDeg: 62 },
        },
      ],
      firingOrder: ['1', '2'],
    }),
    rig: {
      gas: 0,
      rods: [
        { bank: 0, rod: 3.5, offset: 0, piston: 1.3, mass: 0.8, cg: 1.1, inertia: 1.4 },
        {
          bank: 60,
          rod: 2.7,
          offset: 0,
          piston: 1.3,
          mass: 0.5,
          cg: 1.2,
          inertia: 0.5,
          knuckle: { radius: 0.8, angleDeg: 62 },
        },
      ],
    },
  },
]

describe('fillInstant(out, plan, angle): pin loads against a rigid-body engine’s joint reactions', () => {
  it.each(cases)('$name', ({ document, rig }) => {
    const at = instants(document, RPM)
    const [coarse, fine] = [runInEngine(rig, RPM * RAD_S, 1440), runInEngine(rig, RPM * RAD_S, 2880)]
    const wanted = coarse.map((row, i) => row.map((value, j) => 2 * fine[i][j] - value))
    const got = wanted.map((_, i) => {
      const x = at(i * 5)
      return [
        ...[x.crankPinVertical[0], x.crankPinHorizontal[0]],
        ...rig.rods.flatMap((rod, k) => {
          const angle = (rod.bank * Math.PI) / 180
          const [u, v] = [x.pistonPinU[k], x.pistonPinV[k]]
          return [u * Math.cos(angle) - v * Math.sin(angle), u * Math.sin(angle) + v * Math.cos(angle)]
        }),
        ...rig.rods.slice(1).flatMap((_rod, k) => [x.knuckleVertical[k + 1], x.knuckleHorizontal[k + 1]]),
      ]
    })
    const peak = Math.max(...wanted.flat().map(Math.abs))
    const worst = Math.max(...wanted.flatMap((row, i) => row.map((value, j) => Math.abs(value - got[i][j]))))
    expect(worst / peak).toBeLessThan(SHARE)
  })
})
