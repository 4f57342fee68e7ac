import { wrapCentred } from '@/lib/numerics/wrap'
import { beatsBetween, type Beat } from './rhythm'

export interface ClickTrack {
  /** Tells where the crank is and how fast it turns, rad and rad/s, some twenty times a second. */
  follow(angle: number, rate: number): void
  setVolume(volume: number): void
  stop(): void
}

/** Sounds are handed over this much before they are due, s: more than the time between two calls of `follow`. */
const AHEAD = 0.12
/** The crank may be this far from where it was expected, rad, before what is planned counts as past. */
const STRAYED = 0.35
const CLICK = 0.03
const PITCH = 150

/**
 * A click for each beat that the crank passes, at the beat's side. Null where the browser makes no sound. The context
 * must be made in answer to a press.
 */
export function createClickTrack(beats: readonly Beat[], cycle: number, volume: number): ClickTrack | null {
  if (typeof AudioContext === 'undefined') return null
  const context = new AudioContext()
  const loudness = context.createGain()
  loudness.gain.value = volume
  loudness.connect(context.destination)
  const click = clickBuffer(context)
  const sides = new Map<number, StereoPannerNode>()
  for (const { side } of beats)
    if (!sides.has(side)) {
      const panner = context.createStereoPanner()
      panner.pan.value = 0.9 * side
      panner.connect(loudness)
      sides.set(side, panner)
    }
  let at: number | null = null // where the crank is, running on over cycles
  let planned = 0 // up to where clicks are handed over

  return {
    follow(angle, rate) {
      const step: number = at === null ? 0 : wrapCentred(angle - at, cycle)
      const fresh = at === null || Math.abs(step) > STRAYED + Math.abs(rate) * AHEAD
      const here: number = at === null || fresh ? angle : at + step
      at = here
      const ahead = here + rate * AHEAD
      const turned = (planned - here) * rate < 0
      if (fresh || turned) planned = here
      if (rate === 0 || (ahead - planned) * rate <= 0) return
      for (const { beat, angle: due } of beatsBetween(beats, cycle, planned, ahead)) {
        const source = context.createBufferSource()
        source.buffer = click
        source.connect(sides.get(beat.side)!)
        source.start(context.currentTime + Math.max(0, (due - here) / rate))
      }
      planned = ahead
    },
    setVolume(next) {
      loudness.gain.value = next
    },
    stop: () => void context.close(),
  }
}

/** A short dull knock: a damped tone, the same for every cylinder. */
function clickBuffer(context: AudioContext): AudioBuffer {
  const { sampleRate } = context
  const buffer = context.createBuffer(1, Math.ceil(CLICK * sampleRate), sampleRate)
  const samples = buffer.getChannelData(0)
  for (let i = 0; i < samples.length; i++) {
    const t = i / sampleRate
    samples[i] = Math.sin(2 * Math.PI * PITCH * t) * Math.exp(-t / 0.006)
  }
  return buffer
}
