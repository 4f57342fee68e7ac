import { describe, expect, it } from 'vitest'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { built } from './rigs'

describe('fillPose(out, rig, angle), its cost', () => {
  it('poses an engine of 24 cylinders in under 20 µs (bound of 100 µs here, for a machine that has other work)', () => {
    const ids = Array.from({ length: 24 }, (_, i) => `${i + 1}`)
    const { rig } = built('24', {
      format: 'crank-train/1',
      cycle: 'four-stroke',
      cylinderDefaults: { boreMm: 80, strokeMm: 80, rodLengthMm: 140, compressionRatio: 10 },
      masses: { pistonKg: 0.4, rod: { massKg: 0.6, cgFromBigEndMm: 42 } },
      banks: [{ id: 'A', angleDeg: 0 }],
      throws: ids.map((id, i) => ({ id, angleDeg: 60 * i, axialMm: 100 * i })),
      cylinders: ids.map((id, i) => ({ id, bank: 'A', throw: id, axialMm: 100 * i })),
      mains: [...ids, 'end'].map((id, i) => ({ id: `M${id}`, axialMm: 100 * i - 50 })),
      firingOrder: ids,
    })
    const pose = buildPose(rig)
    const rounds = 2000
    let checksum = 0
    let best = Infinity
    for (let batch = 0; batch < 12; batch++) {
      const start = performance.now()
      for (let i = 0; i < rounds; i++) {
        fillPose(pose, rig, i * 0.01)
        checksum += pose[i % pose.length]
      }
      best = Math.min(best, (1000 * (performance.now() - start)) / rounds)
    }
    console.info(`fillPose, 24 cylinders, ${rig.parts.length} parts: ${best.toFixed(2)} µs`)
    expect(Number.isFinite(checksum)).toBe(true)
    expect(best).toBeLessThan(100)
  })
})
