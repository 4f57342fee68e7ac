import { beforeAll, describe, expect, it } from 'vitest'
import {
  bothAnswers,
  compareBalance,
  compareFiring,
  compareGas,
  compareKinematics,
  compareLoads,
  compareMains,
  compareOrders,
  compareShaking,
  compareTorque,
} from '@/tests/support/mechanics/compare'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'
import { randomTrain } from '@/tests/support/mechanics/random-train'

/**
 * The whole analysis against a slow second calculation that shares nothing with it but the document: loop equations
 * by Newton's method, all equations of motion in one dense system, torque by virtual work, pressure by a general
 * integrator, firing by trying every choice. 1e-9 of each signal's peak; 1e-6 where heat release enters.
 */
const cases = [
  ...presetIds.map((id) => ({ name: `preset ${id}`, document: preset(id), rpm: ratedRpm(preset(id)) })),
  ...Array.from({ length: 24 }, (_, k) => {
    const document = randomTrain(k + 1)
    const links = document.cylinders.filter((c) => c.link).length
    const name = `train ${k + 1}: ${document.cylinders.length} cylinders, ${links} links, gas ${document.gas?.model}`
    return { name, document, rpm: 3000 }
  }),
]

describe.each(cases)('analyse(train, …) of $name equals an independent calculation', ({ document, rpm }) => {
  let both: ReturnType<typeof bothAnswers>
  beforeAll(() => {
    both = bothAnswers(document, rpm, 3)
  })

  it.each([
    ['kinematics', compareKinematics],
    ['gas', compareGas],
    ['loads', compareLoads],
    ['mains', compareMains],
    ['torque', compareTorque],
    ['shaking', compareShaking],
    ['orders', compareOrders],
    ['firing', compareFiring],
    ['balance', compareBalance],
  ])('%s', (_, compare) => {
    expect.hasAssertions()
    compare(both)
  })
})
