import { expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { inline, trainOf } from './trains'

const trainWith = (count: number) =>
  trainOf(inline(Array.from({ length: count }, (_, k) => (720 - (720 * k) / count) % 360)))

/** The quickest of some runs, ms: what else the machine does can only make a run slower. */
function quickest(run: () => unknown): number {
  let best = Infinity
  for (let k = 0; k < 12; k++) {
    const before = performance.now()
    run()
    best = Math.min(best, performance.now() - before)
  }
  return best
}

it('analyse(…) grows in proportion to cylinders × angles: eight times either takes less than 32 times as long', () => {
  const [few, many] = [trainWith(8), trainWith(64)]
  quickest(() => analyse(many, { speed: 300, stepDeg: 2 }))
  const base = quickest(() => analyse(few, { speed: 300 }))
  expect(quickest(() => analyse(many, { speed: 300 })) / base).toBeLessThan(32)
  expect(quickest(() => analyse(few, { speed: 300, stepDeg: 0.125 })) / base).toBeLessThan(32)
})
