import { describe, expect, it } from 'vitest'
import * as canvas from '@/scene/canvas/raster/style'
import * as webgl from '@/scene/webgl/manner'

describe('scene/webgl/manner', () => {
  it('both renderers draw by the same figures', () => {
    const shared = Object.entries(webgl)
    expect(shared.length).toBeGreaterThan(10)
    expect(canvas).toMatchObject(Object.fromEntries(shared))
  })
})
