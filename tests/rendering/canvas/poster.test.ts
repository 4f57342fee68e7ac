import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { drawPoster } from '@/scene/canvas/poster'
import { HIDDEN } from '@/scene/frame/types'
import { presetRig, shotOf } from '@/tests/support/drawing/engines'
import { slate, vellum } from '@/tests/support/drawing/small-rig'

const rig = presetRig('v2-45-1600')
const { pose, viewProjection, eye } = shotOf(rig, { aspect: 4 / 3 })

describe('drawPoster(rig, pose, view, theme, visibility, width, height, samples)', () => {
  it('gives RGBA that a PNG encoder takes and gives back', async () => {
    const pixels = drawPoster(rig, pose, { viewProjection, eye }, vellum, null, 240, 180, 4)
    expect(pixels).toHaveLength(240 * 180 * 4)
    const png = await sharp(pixels, { raw: { width: 240, height: 180, channels: 4 } })
      .png()
      .toBuffer()
    const back = await sharp(png).raw().toBuffer({ resolveWithObject: true })
    expect(back.info).toMatchObject({ width: 240, height: 180, channels: 4 })
    expect(Buffer.compare(back.data, Buffer.from(pixels))).toBe(0)
    expect([...pixels.subarray(0, 4)]).toEqual([0xf5, 0xf2, 0xea, 255])
  })

  it('is the same every time, and opaque', () => {
    const one = drawPoster(rig, pose, { viewProjection, eye }, slate, null, 240, 180, 16)
    expect(drawPoster(rig, pose, { viewProjection, eye }, slate, null, 240, 180, 16)).toEqual(one)
    expect(one.every((value, i) => i % 4 !== 3 || value === 255)).toBe(true)
  })

  it('shows the parts that are shown, with the tint over each crown', () => {
    const plain = drawPoster(rig, pose, { viewProjection, eye }, vellum, null, 240, 180, 1)
    const bare = drawPoster(
      rig,
      pose,
      { viewProjection, eye },
      vellum,
      new Uint8Array(rig.parts.length).fill(HIDDEN),
      240,
      180,
      1,
    )
    expect(bare.every((value, i) => value === [0xf5, 0xf2, 0xea, 255][i % 4])).toBe(true)
    const tint = Float32Array.from(rig.anchors.firing, () => 1)
    expect(drawPoster(rig, pose, { viewProjection, eye, tint }, vellum, null, 240, 180, 1)).not.toEqual(plain)
  })
})
