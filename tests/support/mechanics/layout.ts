import type { CrankTrainInput } from '@/scene/model/crank-train'
import { answer } from './kernel'

/** One cylinder of a layout: its throw's angle, its axis and its place along the crank in pitches. */
export interface Place {
  pin: number
  bank: number
  z: number
}

export interface Size {
  radius: number
  rod: number
  mass: number
  pitch: number
}

const DEFAULT: Size = { radius: 0.04, rod: 0.16, mass: 0.5, pitch: 0.1 }

/** Equal cylinders with weightless rods: the reciprocating masses alone, as balancing tables have them. */
export function layout(places: Place[], size: Partial<Size> = {}): CrankTrainInput {
  const { radius, rod, mass, pitch } = { ...DEFAULT, ...size }
  return {
    format: 'crank-train/1',
    cycle: 'two-stroke',
    cylinderDefaults: { boreMm: 80, strokeMm: radius * 2000, rodLengthMm: rod * 1000, compressionRatio: 10 },
    masses: { pistonKg: mass, rod: { massKg: 1e-12, cgFromBigEndMm: rod * 250 } },
    banks: places.map(({ bank }, i) => ({ id: `${i + 1}`, angleDeg: bank })),
    throws: places.map(({ pin, z }, i) => ({ id: `${i + 1}`, angleDeg: pin, axialMm: z * pitch * 1000 })),
    cylinders: places.map(({ z }, i) => ({
      id: `${i + 1}`,
      bank: `${i + 1}`,
      throw: `${i + 1}`,
      axialMm: z * pitch * 1000,
    })),
    referenceAxialMm: 0,
    firingOrder: places
      .map(({ pin, bank }, i) => ({ id: `${i + 1}`, at: (((bank - pin) % 360) + 360) % 360 }))
      .sort((a, b) => a.at - b.at)
      .map(({ id }) => id),
  }
}

/** What a force or couple of one order is made of: the part that turns with the crank and the part against it. */
export interface Ellipse {
  forward: number
  backward: number
  max: number
  min: number
  /** Direction of the long axis, degrees in 0…180. */
  axisDeg: number
}

const DEG = Math.PI / 180

interface Phasor {
  amplitude: number
  phaseDeg: number
}

/** From the two components alone: vertical + i·horizontal as a vector that turns forward and one that turns back. */
function ellipse(vertical: Phasor, horizontal: Phasor, unit: number) {
  const part = (sign: 1 | -1) => {
    const [v, h] = [-sign * vertical.phaseDeg * DEG, -sign * horizontal.phaseDeg * DEG]
    const re = vertical.amplitude * Math.cos(v) - horizontal.amplitude * Math.sin(h)
    const im = vertical.amplitude * Math.sin(v) + horizontal.amplitude * Math.cos(h)
    return { size: Math.hypot(re, im) / 2 / unit, angle: Math.atan2(im, re) }
  }
  const [forward, backward] = [part(1), part(-1)]
  const axisDeg = ((((forward.angle + backward.angle) / 2 / DEG) % 180) + 180) % 180
  return { max: forward.size + backward.size, min: Math.abs(forward.size - backward.size), axisDeg }
}

/** Force and couple of one order in units of one cylinder's force of that order, and of that force times the pitch. */
export function orderOf(places: Place[], n: number, size: Partial<Size> = {}) {
  const all = { ...DEFAULT, ...size }
  const find = (document: CrankTrainInput) => answer(document, 3000, 5).orders.find((o) => o.order === n)!
  const unit = find(layout([{ pin: 0, bank: 0, z: 0 }], size)).vertical.amplitudeN
  const o = find(layout(places, size))
  const force = ellipse(
    { amplitude: o.vertical.amplitudeN, phaseDeg: o.vertical.phaseDeg },
    { amplitude: o.horizontal.amplitudeN, phaseDeg: o.horizontal.phaseDeg },
    unit,
  )
  const couple = ellipse(
    { amplitude: o.coupleVertical.amplitudeNm, phaseDeg: o.coupleVertical.phaseDeg },
    { amplitude: o.coupleHorizontal.amplitudeNm, phaseDeg: o.coupleHorizontal.phaseDeg },
    unit * all.pitch,
  )
  return {
    force: { ...force, forward: o.forwardN / unit, backward: o.backwardN / unit },
    couple: {
      ...couple,
      forward: o.forwardNm / (unit * all.pitch),
      backward: o.backwardNm / (unit * all.pitch),
    },
  }
}
