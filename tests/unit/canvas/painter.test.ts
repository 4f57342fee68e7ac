import { describe, expect, it } from 'vitest'
import { createPainter } from '@/scene/canvas/painter'
import { fine } from '@/scene/canvas/raster/fine'
import type { Fine } from '@/scene/canvas/raster/types'
import { boxMesh, frameOf, poseOf, rigOf, slate, vellum } from '@/tests/support/drawing/small-rig'

const rig = rigOf([{ mesh: boxMesh(1, 1, 1) }])
const frame = (turn: number) => frameOf(poseOf({ turn }), { eye: [3, 3, -9], fov: 0.3, aspect: 4 / 3 })

/** A sheet that keeps what was put on it, and a queue that runs when told. */
function bench(cost = 1, start: Fine | null = fine) {
  let time = 0
  const waiting: (() => void)[] = []
  const puts: { box: number[]; image: Uint32Array }[] = []
  const sizes: [number, number][] = []
  const sheet = {
    resize: (width: number, height: number) => void sizes.push([width, height]),
    put: (image: Uint32Array<ArrayBuffer>, box: Int32Array) =>
      void puts.push({ box: [...box], image: image.slice() }),
  }
  const pacing = { now: () => (time += cost), soon: (step: () => void) => void waiting.push(step) }
  const painter = createPainter(sheet, pacing, start)
  const run = (steps = Infinity) => {
    for (let i = 0; i < steps && waiting.length; i++) waiting.shift()?.()
  }
  return { painter, puts, sizes, waiting, run }
}

function set(cost?: number) {
  const all = bench(cost)
  all.painter.setTheme(vellum)
  all.painter.setRig(rig)
  all.painter.resize(160, 120, 1)
  return all
}

describe('createPainter(sheet, pacing)', () => {
  it('paints nothing before it has rig and theme', () => {
    const { painter, puts } = bench()
    painter.draw(frame(0), false)
    painter.setRig(rig)
    painter.draw(frame(0), false)
    expect(puts).toHaveLength(0)
    painter.setTheme(vellum)
    painter.draw(frame(0), false)
    expect(puts).toHaveLength(1)
  })

  it('puts one picture for a moving frame and leaves it', () => {
    const { painter, puts, run } = set()
    expect(painter.draw(frame(0), false)).toMatchObject({ width: 160, height: 120 })
    run()
    expect(puts).toHaveLength(1)
  })

  it('shows a still frame at once, after 4 and after 16 samples, the same every time', () => {
    const one = set()
    one.painter.draw(frame(0.2), true)
    expect(one.puts).toHaveLength(1)
    one.run()
    expect(one.puts).toHaveLength(3)
    const two = set()
    two.painter.draw(frame(0.9), true)
    two.run(7)
    two.painter.draw(frame(0.2), true)
    two.run()
    expect(two.puts[two.puts.length - 1].image).toEqual(one.puts[2].image)
  })

  it('paints plainly until it is enriched, then at once as if it had always been', () => {
    const { painter, puts, run } = bench(1, null)
    painter.setTheme(vellum)
    painter.setRig(rig)
    painter.resize(160, 120, 1)
    painter.draw(frame(0.2), true)
    run()
    expect(puts).toHaveLength(1)
    painter.enrich(fine)
    run()
    const always = set()
    always.painter.draw(frame(0.2), true)
    always.run()
    expect(puts).toHaveLength(4)
    expect(puts[3].image).toEqual(always.puts[2].image)
  })

  it('gives the refinement up at the next frame', () => {
    const { painter, puts, run, waiting } = set()
    painter.draw(frame(0.2), true)
    run(6)
    expect(puts).toHaveLength(2)
    painter.draw(frame(0.3), false)
    run()
    expect(puts).toHaveLength(3)
    expect(waiting).toHaveLength(0)
    const moving = set()
    moving.painter.draw(frame(0.3), false)
    expect(puts[2].image).toEqual(moving.puts[0].image)
  })

  it('goes on refining when the same still frame is asked for again', () => {
    const { painter, puts, run } = set()
    painter.draw(frame(0.2), true)
    run(5)
    painter.draw(frame(0.2), true)
    run()
    expect(puts).toHaveLength(3)
  })

  it('draws the last frame again, whole, when the colours change', () => {
    const { painter, puts, run } = set()
    painter.draw(frame(0.2), false)
    painter.setTheme(slate)
    run()
    expect(puts).toHaveLength(2)
    expect(puts[1].box).toEqual([0, 0, 160, 120])
    const dark = set()
    dark.painter.setTheme(slate)
    dark.painter.draw(frame(0.2), false)
    expect(puts[1].image).toEqual(dark.puts[0].image)
  })

  it('draws the last frame again when a part is hidden', () => {
    const { painter, puts, run } = set()
    painter.draw(frame(0.2), false)
    painter.setVisibility(Uint8Array.of(0))
    run()
    expect(puts).toHaveLength(2)
    expect(new Set(puts[1].image).size).toBe(1)
  })

  it('draws moving frames smaller when they take long, the still one in full, and larger again when they are quick', () => {
    const { painter, sizes } = set(30)
    painter.resize(1600, 900, 2)
    for (let i = 0; i < 30; i++) painter.draw(frame(i), false)
    expect(sizes.map(([width]) => width)).toEqual([2560 * Math.sqrt(1600 / 1440), 1280, 960].map(Math.round))
    painter.draw(frame(0), true)
    expect(sizes[sizes.length - 1][0]).toBe(sizes[0][0])
  })

  it('does no more after dispose', () => {
    const { painter, puts, run } = set()
    painter.draw(frame(0.2), true)
    painter.dispose()
    run()
    painter.draw(frame(0.2), true)
    expect(puts).toHaveLength(1)
  })
})
