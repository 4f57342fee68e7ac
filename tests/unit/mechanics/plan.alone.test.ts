import { describe, expect, it } from 'vitest'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { presetTrain, RPM } from './trains'

describe('fillInstant(out, plan, angle)', () => {
  it('allocates no array and no object', () => {
    const plan = buildPlan(presetTrain('r7-11'), 2000 * RPM)
    const instant = buildInstant(plan)
    const run = (times: number) => {
      for (let k = 0; k < times; k++) fillInstant(instant, plan, 0.01 * k)
    }
    run(20_000)
    const made = Array.from({ length: 8 }, () => {
      const before = process.memoryUsage().heapUsed
      run(1000)
      return (process.memoryUsage().heapUsed - before) / 1000
    }).sort((a, b) => a - b)
    // the compiler works beside it and makes things of its own, so the middle counts; the engine may box a number handed
    // from function to function; the least array a cylinder would be 700 bytes a call
    expect(made[4]).toBeLessThan(300)
  })
})
