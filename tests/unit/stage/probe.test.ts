import { describe, expect, it } from 'vitest'
import { createPace } from '@/scene/stage/pace'
import { chooseRenderer } from '@/scene/stage/probe'

describe('chooseRenderer(asked, gpu)', () => {
  it.each([
    'ANGLE (Google, Vulkan 1.3.0 (SwiftShader Device (Subzero)), SwiftShader driver)',
    'llvmpipe (LLVM 15.0.6, 256 bits)',
    'softpipe',
    'Software Rasterizer',
    'ANGLE (Microsoft, Microsoft Basic Render Driver Direct3D11 vs_5_0 ps_5_0)',
  ])('auto takes the canvas where WebGL is drawn by software: %s', (gpu) => {
    expect(chooseRenderer('auto', gpu)).toMatchObject({
      kind: 'canvas',
      reason: expect.stringMatching(/^Drawn without 3D graphics: /),
    })
  })

  it.each(['ANGLE (Intel, Mesa Intel(R) UHD Graphics 620, OpenGL 4.6)', 'Apple GPU', ''])(
    'auto takes WebGL from a graphics processor, also where its name is kept secret: "%s"',
    (gpu) => {
      expect(chooseRenderer('auto', gpu).kind).toBe('webgl')
    },
  )

  it('without WebGL every wish ends at the canvas, in a sentence that says so', () => {
    for (const asked of ['auto', 'webgl', 'canvas'] as const)
      expect(chooseRenderer(asked, null)).toMatchObject({
        kind: 'canvas',
        reason: expect.stringMatching(/^Drawn without 3D graphics: .*\.$/),
      })
  })

  it('a stated wish beats the name', () => {
    expect(chooseRenderer('webgl', 'SwiftShader').kind).toBe('webgl')
    expect(chooseRenderer('canvas', 'Apple GPU').kind).toBe('canvas')
  })
})

describe('createPace().add(seconds)', () => {
  const run = (seconds: number[]) => {
    const pace = createPace()
    return seconds.map((each) => pace.add(each))
  }

  it('a second of 60 ms frames is poor', () => {
    expect(run(Array(17).fill(0.06)).at(-1)).toBe(true)
  })

  it('a second of 40 ms frames is not, nor one with a few long ones', () => {
    expect(run(Array(30).fill(0.04))).not.toContain(true)
    expect(run([0.3, 0.3, ...Array(30).fill(0.016)])).not.toContain(true)
  })

  it('less than a second says nothing', () => {
    expect(run(Array(10).fill(0.09))).not.toContain(true)
  })
})
