import { describe, expect, it } from 'vitest'
import { bearings, bearingSignal, turnedSignal } from '@/lib/mechanics/loads/bearings'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { leastLoadedSector, surfaceLoad } from '@/lib/mechanics/loads/surface-load'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset } from '@/tests/support/mechanics/presets'
import { DEG, RPM } from './trains'

const constant = (value: number) => new Float64Array(720).fill(value)
const turning = (size: number, shift = 0) => ({
  x: Float64Array.from({ length: 720 }, (_, j) => size * Math.cos(j * DEG + shift)),
  y: Float64Array.from({ length: 720 }, (_, j) => size * Math.sin(j * DEG + shift)),
})

describe('surfaceLoad(x, y, pressed)', () => {
  it('of a steady load is F·cos from the pressed side, and nothing on the other half', () => {
    const along = surfaceLoad(constant(100), constant(0), 1)
    const against = surfaceLoad(constant(100), constant(0), -1)
    for (let point = 0; point < 360; point++) {
      const cos = Math.cos(point * DEG)
      expect(along[point]).toBeCloseTo(100 * Math.max(0, cos), 9)
      expect(against[point]).toBeCloseTo(100 * Math.max(0, -cos), 9)
    }
  })

  it('of a load that goes round evenly is F/π everywhere', () => {
    const { x, y } = turning(100)
    for (const press of surfaceLoad(x, y, 1)) expect(press).toBeCloseTo(100 / Math.PI, 2)
  })
})

describe('leastLoadedSector(surface, width)', () => {
  it('lies in the middle of a half that is not pressed at all', () => {
    const sector = leastLoadedSector(surfaceLoad(constant(100), constant(0), -1))
    expect(sector.from / DEG).toBeCloseTo(330, 9)
    expect(sector.to / DEG).toBeCloseTo(390, 9)
    expect(sector.middle / DEG).toBeCloseTo(0, 9)
    expect(sector.mean).toBeCloseTo(0, 12)
    expect(sector.share).toBeCloseTo(0, 12)
  })

  it('turns with the load and grows with it', () => {
    const parts = cycleParts(trainOf(preset('i4-2000')), 1)
    const rod = bearings(parts).find(({ kind }) => kind === 'rod')!
    const { radial, tangential } = turnedSignal(bearingSignal(parts, rod, 'total', 300), rod.stand)
    const turned = (angle: number, size: number) => {
      const [cos, sin] = [size * Math.cos(angle), size * Math.sin(angle)]
      return leastLoadedSector(
        surfaceLoad(
          radial.map((x, j) => x * cos - tangential[j] * sin),
          radial.map((x, j) => x * sin + tangential[j] * cos),
          -1,
        ),
      )
    }
    const [plain, other] = [turned(0, 1), turned(70 * DEG, 3)]
    expect((other.middle - plain.middle) / DEG).toBeCloseTo(70, 6)
    expect(other.mean / plain.mean).toBeCloseTo(3, 9)
    expect(other.share).toBeCloseTo(plain.share, 9)
  })

  it('has no more in it than any other sector of its width, and less than the mean', () => {
    const parts = cycleParts(trainOf(preset('v8x-5000')))
    const main = bearings(parts).filter(({ kind }) => kind === 'main')[2]
    const { radial, tangential } = turnedSignal(bearingSignal(parts, main, 'total', 5000 * RPM), main.stand)
    const surface = surfaceLoad(radial, tangential, 1)
    const least = leastLoadedSector(surface, 90 * DEG)
    expect((least.to - least.from) / DEG).toBeCloseTo(90, 9)
    for (let from = 0; from < 360; from++) {
      let mean = (surface[from] + surface[(from + 90) % 360]) / 180
      for (let k = 1; k < 90; k++) mean += surface[(from + k) % 360] / 90
      expect(least.mean).toBeLessThanOrEqual(mean * (1 + 1e-9))
    }
    expect(least.share).toBeLessThan(1)
  })

  it('of a pin faces the crank where gas presses, and away from it where only inertia pulls', () => {
    const parts = cycleParts(trainOf(preset('single-450')))
    const rod = bearings(parts).find(({ kind }) => kind === 'rod')!
    const middle = (part: 'gas' | 'inertia') => {
      const { radial, tangential } = turnedSignal(bearingSignal(parts, rod, part, 800), rod.stand)
      return Math.cos(leastLoadedSector(surfaceLoad(radial, tangential, rod.pressed)).middle)
    }
    expect(middle('gas')).toBeLessThan(-0.5)
    expect(middle('inertia')).toBeGreaterThan(0.5)
  })

  it('of nothing at all is a sector with nothing in it', () => {
    expect(leastLoadedSector(new Float64Array(360))).toMatchObject({ mean: 0, share: 0 })
  })
})
