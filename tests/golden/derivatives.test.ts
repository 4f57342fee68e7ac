import { all, create } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { expectClose } from '@/tests/support/mechanics/close'
import { answer, RAD_S } from '@/tests/support/mechanics/kernel'
import { single } from '@/tests/support/mechanics/published/rig'

const math = create(all)
const position = math.parse('r * cos(x) + sqrt(l^2 - (r * sin(x) - e)^2)')
const first = math.derivative(position, 'x')
const second = math.derivative(first, 'x')
const [s, slope, bend] = [position, first, second].map((node) => node.compile())

describe('piston motion against symbolic derivatives of s = r cos x + √(l² − (r sin x − e)²)', () => {
  it.each([
    { radius: 0.0441, rod: 0.156, offset: 0, rpm: 6500 },
    { radius: 0.0438, rod: 0.1465, offset: 0.008, rpm: 6000 },
    { radius: 0.032, rod: 0.1065, offset: -0.002, rpm: 9000 },
    { radius: 1.075, rod: 2.24, offset: 0, rpm: 105 },
    { radius: 0.05, rod: 0.075, offset: 0.02, rpm: 1000 },
    { radius: 0.05, rod: 0.06, offset: -0.009, rpm: 3000 },
  ])('kinematics of r $radius, l $rod, e $offset at $rpm rpm', ({ rpm, ...it }) => {
    const speed = rpm * RAD_S
    const { angleDeg, kinematics } = answer(single(it), rpm)
    const k = kinematics['1']
    const at = (node: typeof s) =>
      [...angleDeg].map((deg) => {
        const scope = { r: it.radius, l: it.rod, e: it.offset, x: (deg * Math.PI) / 180 }
        return node.evaluate(scope) as number
      })
    expectClose(
      'position',
      k.pinHeightMm,
      at(s).map((m) => m * 1000),
      1e-12,
    )
    expectClose(
      'velocity',
      k.velocityMS,
      at(slope).map((d) => d * speed),
      1e-12,
    )
    expectClose(
      'acceleration',
      k.accelerationMS2,
      at(bend).map((d) => d * speed ** 2),
      1e-11,
    )
    expect.hasAssertions()
  })
})
