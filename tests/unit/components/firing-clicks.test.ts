import { afterEach, describe, expect, it, vi } from 'vitest'
import { createClickTrack } from '@/components/firing/click-track'
import type { Beat } from '@/components/firing/rhythm'

const started: { at: number; pan: number }[] = []
const state = { closed: false, time: 0, gain: 0 }

/** As much of a sound context as the clicks use; it notes when each would sound, and on which side. */
class QuietContext {
  sampleRate = 8000
  destination = {}
  get currentTime() {
    return state.time
  }
  createGain() {
    return {
      gain: {
        set value(next: number) {
          state.gain = next
        },
      },
      connect: () => undefined,
    }
  }
  createStereoPanner() {
    return { pan: { value: 0 }, connect: () => undefined }
  }
  createBuffer(_channels: number, length: number) {
    return { getChannelData: () => new Float32Array(length) }
  }
  createBufferSource() {
    let pan = 0
    return {
      buffer: null,
      connect: (panner: { pan: { value: number } }) => (pan = panner.pan.value),
      start: (at: number) => started.push({ at, pan }),
    }
  }
  close() {
    state.closed = true
    return Promise.resolve()
  }
}

const beats: Beat[] = [
  { cylinder: 0, angle: 0, side: -1 },
  { cylinder: 1, angle: Math.PI, side: 1 },
]
const CYCLE = 2 * Math.PI

afterEach(() => {
  vi.unstubAllGlobals()
  started.length = 0
  Object.assign(state, { closed: false, time: 0 })
})

describe('createClickTrack(beats, cycle, volume)', () => {
  it('is null where the browser makes no sound', () => {
    vi.stubGlobal('AudioContext', undefined)
    expect(createClickTrack(beats, CYCLE, 0.4)).toBeNull()
  })

  it('sounds each beat once when it is passed, on its side, however often it looks', () => {
    vi.stubGlobal('AudioContext', QuietContext)
    const track = createClickTrack(beats, CYCLE, 0.4)!
    const rate = 2 * Math.PI // one turn a second
    for (let look = 0; look <= 60; look++) {
      state.time = look * 0.05
      track.follow((0.1 + rate * state.time) % CYCLE, rate)
    }
    // from 0.1 rad on: the second beat after 0.484 s, the first after 0.984 s, and so on for three turns
    const wanted = [0.5, 1, 1.5, 2, 2.5, 3].map((turns) => turns - 0.1 / rate)
    expect(started).toHaveLength(6)
    started.forEach(({ at, pan }, index) => {
      expect(at).toBeCloseTo(wanted[index], 9)
      expect(pan).toBeCloseTo(index % 2 === 0 ? 0.9 : -0.9, 9)
    })
  })

  it('is silent while the crank stands, and does not make up for a leap', () => {
    vi.stubGlobal('AudioContext', QuietContext)
    const track = createClickTrack(beats, CYCLE, 0.4)!
    track.follow(0.1, 0)
    track.follow(0.1, 0)
    track.follow(2.9, 0)
    track.follow(0.2, 0.01)
    expect(started).toEqual([])
  })

  it('takes the volume and ends for good', () => {
    vi.stubGlobal('AudioContext', QuietContext)
    const track = createClickTrack(beats, CYCLE, 0.4)!
    expect(state.gain).toBe(0.4)
    track.setVolume(0.1)
    expect(state.gain).toBe(0.1)
    track.stop()
    expect(state.closed).toBe(true)
  })
})
