import { describe, expect, it } from 'vitest'
import { createLoop, quiet } from '@/scene/stage/loop'

/** A loop with a renderer that paints at once, or when `paint` is called. */
function bench({ later = false } = {}) {
  const drawn: string[] = []
  const finished: string[] = []
  let busy = false
  const name = (still: boolean) => (still ? 'still' : 'moving')
  const loop = createLoop({
    draw(still) {
      if (busy) return false
      drawn.push(name(still))
      if (!later) loop.painted()
      return true
    },
    finish: (still) => void finished.push(name(still)),
  })
  return { loop, drawn, finished, setBusy: (next: boolean) => (busy = next) }
}

describe('createLoop(work)', () => {
  it('untouched, draws nothing and asks for no frame', () => {
    const { loop, drawn } = bench()
    expect(loop.tick(0)).toBe(false)
    expect(drawn).toEqual([])
  })

  it('a touch is drawn at the next tick, and once more when it has been quiet', () => {
    const { loop, drawn } = bench()
    loop.touch()
    expect(loop.tick(0)).toBe(true)
    expect(loop.tick(quiet - 1)).toBe(true)
    expect(drawn).toEqual(['moving'])
    expect(loop.tick(quiet)).toBe(false)
    expect(loop.tick(quiet + 16)).toBe(false)
    expect(drawn).toEqual(['moving', 'still'])
  })

  it('touches in every frame never make a still picture', () => {
    const { loop, drawn } = bench()
    for (let now = 0; now < 1000; now += 16) {
      loop.touch()
      loop.tick(now)
    }
    expect(new Set(drawn)).toEqual(new Set(['moving']))
  })

  it('a busy renderer is asked again, and the change is not lost', () => {
    const { loop, drawn, setBusy } = bench()
    setBusy(true)
    loop.touch()
    expect(loop.tick(0)).toBe(true)
    setBusy(false)
    loop.tick(16)
    expect(drawn).toEqual(['moving'])
  })

  it('nothing is filled anew while a picture is on its way, and it is finished once', () => {
    const { loop, drawn, finished } = bench({ later: true })
    loop.touch()
    loop.tick(0)
    loop.touch()
    expect(loop.tick(16)).toBe(true)
    expect(drawn).toHaveLength(1)
    loop.painted()
    loop.painted()
    expect(finished).toEqual(['moving'])
    loop.tick(32)
    expect(drawn).toHaveLength(2)
  })

  it('a picture that never comes does not stop the drawing for ever', () => {
    const { loop, drawn } = bench({ later: true })
    loop.touch()
    loop.tick(0)
    loop.touch()
    loop.tick(5000)
    expect(drawn).toHaveLength(2)
  })
})
