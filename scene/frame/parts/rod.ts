import { addLathe, tubeProfile } from '../mesh/lathe'
import type { MeshBuilder } from '../mesh/mesh-builder'
import { arc, bothSides, circle, through, type Outline } from '../mesh/outline'
import { addPrism } from '../mesh/prism'
import type { RodSize } from './rod-size'

const EYE_STEPS = 30
/** Where the beam meets an eye it ends a little inside it, so that no gap opens between two polygons. */
const INSIDE = 0.985

/** Beam, upper half of the big end (all of it on a one-piece rod) and small end. `side` mirrors the knuckles. */
export function addRod(builder: MeshBuilder, size: RodSize, side: -1 | 1) {
  addBeam(builder, size)
  addLathe(builder, {
    profile: tubeProfile(size.smallBore, size.smallRadius, -size.smallHalf, size.smallHalf),
    axis: 'z',
    at: [0, size.length],
    steps: 24,
  })
  if (size.knuckles.length > 0) return addMasterEnd(builder, size, side)
  for (const { from, to } of size.bigEnds) {
    if (size.onePiece) {
      addLathe(builder, {
        profile: tubeProfile(size.bigBore, size.bigRadius, from, to),
        axis: 'z',
        steps: EYE_STEPS,
      })
    } else addPrism(builder, { outline: halfEye(size), from, to })
  }
  if (size.bigEnds.length > 1) addFork(builder, size)
}

/** The cap with its two bolts. */
export function addRodCap(builder: MeshBuilder, size: RodSize) {
  const upper = halfEye(size)
  const lower: Outline = upper.map((value) => -value)
  for (const { from, to } of size.bigEnds) {
    addPrism(builder, { outline: lower, from, to })
    const { lug, shoulder } = halfEyeSize(size)
    const bolt = 0.115 * size.bigBore
    for (const x of [-1, 1]) {
      addLathe(builder, {
        profile: tubeProfile(0, bolt, -shoulder - 0.9 * bolt, -shoulder),
        steps: 6,
        at: [(from + to) / 2, x * (lug - 1.15 * bolt)],
      })
    }
  }
}

function halfEyeSize(size: RodSize) {
  return { lug: 1.52 * size.bigBore, shoulder: 0.5 * size.bigBore }
}

/** Half an eye above its split line with a shoulder for a bolt on either side. */
function halfEye(size: RodSize): Outline {
  const { lug, shoulder } = halfEyeSize(size)
  const from = Math.asin(Math.min((shoulder * 1.3) / size.bigRadius, 0.9))
  return [
    ...through([size.bigBore, 0], [lug, 0], [lug, shoulder]),
    ...arc(0, 0, size.bigRadius, from, Math.PI - from, EYE_STEPS),
    ...through([-lug, shoulder], [-lug, 0]),
    ...arc(0, 0, size.bigBore, Math.PI, 0, EYE_STEPS).slice(0, -2),
  ]
}

/** Half the beam's width from its big end (t 0) to its small end (t 1): slender at the top, spreading into the big end. */
function beamHalfWidth({ smallRadius, bigRadius }: RodSize, t: number): number {
  const small = 0.74 * smallRadius
  const big = Math.min(Math.max(1.3 * small, 0.56 * bigRadius), 0.8 * bigRadius)
  const flare = Math.min(0.86 * bigRadius, 1.5 * big) - big
  return big + (small - big) * t + flare * (1 - t) ** 5
}

const BEAM_STEPS = 6

/** Radius about the crank pin that the beam starts from. */
function beamStart(size: RodSize): number {
  if (size.knuckles.length > 0) return masterRadius(size)
  return size.bigEnds.length > 1 ? 1.28 * size.bigRadius : size.bigRadius
}

/** Where the beam leaves its two eyes; null where they meet and there is no beam. */
function beamEnds(size: RodSize) {
  const low = INSIDE * beamStart(size)
  const high = INSIDE * size.smallRadius
  const room = size.length - low - high
  if (room <= 0) return null
  const lowAngle = Math.acos(Math.min(beamHalfWidth(size, 0) / low, 0.95))
  const highAngle = Math.acos(Math.min(beamHalfWidth(size, 1) / high, 0.95))
  const bottom = low * Math.sin(lowAngle)
  const top = size.length - high * Math.sin(highAngle)
  return { low, high, room, lowAngle, highAngle, bottom, top }
}

/** Half the drawn beam's width at places along the rod from its big end. */
export function shankOf(size: RodSize): { along: number; half: number }[] {
  const ends = beamEnds(size)
  if (!ends) return []
  const { bottom, top } = ends
  return Array.from({ length: BEAM_STEPS + 1 }, (_, i) => {
    const t = i / BEAM_STEPS
    return { along: bottom + (top - bottom) * t, half: beamHalfWidth(size, t) }
  })
}

function addBeam(builder: MeshBuilder, size: RodSize) {
  const ends = beamEnds(size)
  if (!ends) return
  const { low, high, room, lowAngle, highAngle, bottom, top } = ends
  const side = (from: number, to: number, inset: number, first: number, last: number): Outline => {
    const points: Outline = []
    for (let i = first; i <= last; i++) {
      const y = from + ((to - from) * i) / BEAM_STEPS
      points.push(beamHalfWidth(size, (y - bottom) / (top - bottom)) - inset, y)
    }
    return points
  }
  const right = side(bottom, top, 0, 1, BEAM_STEPS - 1)
  const left = bothSides(right).slice(right.length)
  const outline = [
    ...right,
    ...arc(0, size.length, high, -highAngle, highAngle - Math.PI, EYE_STEPS),
    ...left,
    ...arc(0, 0, low, Math.PI - lowAngle, lowAngle, EYE_STEPS),
  ]
  const flange = 0.36 * beamHalfWidth(size, 1)
  const margin = 0.1 * room
  const hollow = bothSides(side(low + margin, size.length - high - margin, flange, 0, BEAM_STEPS))
  addPrism(builder, {
    outline,
    from: -size.beamHalf,
    to: size.beamHalf,
    pockets: room > 0.2 * size.length ? { outlines: [hollow], depth: 0.62 * size.beamHalf } : undefined,
  })
}

/** The bridge above the blade's big end that joins the two prongs of a fork, and the prongs down to its eyes. */
function addFork(builder: MeshBuilder, size: RodSize) {
  const inner = 1.1 * size.bigRadius
  const outer = 1.34 * size.bigRadius
  const spread = 0.62
  const up = Math.PI / 2
  const bridge = [
    ...arc(0, 0, inner, up + spread, up - spread),
    ...arc(0, 0, outer, up - spread, up + spread),
  ]
  const first = size.bigEnds[0].from
  const last = size.bigEnds[size.bigEnds.length - 1].to
  addPrism(builder, { outline: bridge, from: first, to: last })
  const low = INSIDE * size.bigRadius
  const prong = [...arc(0, 0, low, up + spread, up - spread), ...arc(0, 0, inner, up - spread, up + spread)]
  for (const { from, to } of size.bigEnds) addPrism(builder, { outline: prong, from, to })
}

const masterRadius = (size: RodSize) => Math.max(...size.knuckles.map((pin) => pin.radius + 2 * pin.pin))

/** A master's big end: a hub on the pin and two flanges that hold the knuckle pins of the link rods between them. */
function addMasterEnd(builder: MeshBuilder, size: RodSize, side: -1 | 1) {
  const { from, to } = size.bigEnds[0]
  const radius = masterRadius(size)
  const third = (to - from) * 0.27
  addLathe(builder, { profile: tubeProfile(size.bigBore, size.bigRadius, from, to), axis: 'z' })
  const flange = { outline: circle(0, 0, radius), holes: [circle(0, 0, INSIDE * size.bigRadius)] }
  const inset = 0.04 * (to - from)
  addPrism(builder, { ...flange, from: from + inset, to: from + third })
  addPrism(builder, { ...flange, from: to - third, to: to - inset })
  for (const { angle, radius: at, pin } of size.knuckles) {
    addLathe(builder, {
      profile: tubeProfile(0, pin, from, to),
      axis: 'z',
      at: [side * at * Math.sin(angle), at * Math.cos(angle)],
      steps: 20,
    })
  }
}
