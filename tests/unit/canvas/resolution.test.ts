import { describe, expect, it } from 'vitest'
import { createResolution } from '@/scene/canvas/resolution'

const pixelsAt = (scale: number) => Math.round(1440 * scale) * Math.round(900 * scale)

/** Draws for a while on a machine that paints so many pixels a millisecond. */
function settle(pixelsAMillisecond: number, frames = 200, resolution = createResolution()) {
  const all = pixelsAt(2)
  for (let i = 0; i < frames; i++) {
    const pixels = pixelsAt(resolution.scale(1440, 900, 2, false))
    resolution.add(pixels / pixelsAMillisecond, pixels, all)
  }
  return { scale: resolution.scale(1440, 900, 2, false), resolution }
}

describe('createResolution()', () => {
  it('begins with all of the device’s pixels, up to 4 million', () => {
    expect(createResolution().scale(800, 600, 2, false)).toBe(2)
    const scale = createResolution().scale(3840, 2160, 2, true)
    expect(3840 * 2160 * scale * scale).toBeLessThanOrEqual(2560 * 1600 + 1)
  })

  it('stays there on a fast machine', () => {
    expect(settle(1e6).scale).toBeCloseTo(createResolution().scale(1440, 900, 2, false), 9)
  })

  it.each([
    [100_000, 1280 * 720],
    [40_000, 960 * 540],
    [5_000, 640 * 360],
  ])('goes down by classes at %i pixels a millisecond, and stays', (speed, pixels) => {
    const { scale } = settle(speed)
    expect(1440 * 900 * scale * scale).toBeCloseTo(pixels, 0)
  })

  it('draws the still picture in full whatever the class', () => {
    const { resolution } = settle(5_000)
    expect(resolution.scale(1440, 900, 2, true)).toBe(createResolution().scale(1440, 900, 2, true))
  })

  it('comes back when the machine is free again', () => {
    const { resolution } = settle(5_000)
    expect(settle(1e6, 200, resolution).scale).toBe(createResolution().scale(1440, 900, 2, false))
  })
})
