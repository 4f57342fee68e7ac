import { addLathe, tubeProfile } from '../mesh/lathe'
import type { MeshBuilder } from '../mesh/mesh-builder'
import { arc, circle, rectangle, through } from '../mesh/outline'
import { addPrism } from '../mesh/prism'
import { pinBoreOf, type PistonSize } from './piston-size'

/** Of a turn, alike for lands and rings, so that their chords lie over each other. */
const STEPS = 36

/** Crown, ring belt, two skirt pads and the pin bosses between them; of a crosshead engine the piston on its rod. */
export function addPiston(builder: MeshBuilder, size: PistonSize, smallEndHalf: number) {
  const { radius, crown, beltBottom } = size
  const edge = 0.025 * size.bore
  addLathe(builder, {
    profile: through(
      [0, beltBottom],
      [radius, beltBottom],
      [radius, crown - edge],
      [radius - edge, crown],
      [0, crown],
    ),
    steps: STEPS,
    specAt: (point) => (point === 3 ? { fill: 'crown' } : {}),
  })
  if (size.rodLength > 0) return addPistonRod(builder, size)
  addSkirt(builder, size)
  addBosses(builder, size, smallEndHalf)
}

/** Thrust pads: sectors of the skirt on the two sides that the rod leans against. */
function addSkirt(builder: MeshBuilder, { radius, bore, beltBottom, skirtBottom }: PistonSize) {
  const half = (2 * Math.PI * 4) / STEPS
  const wall = 0.05 * bore
  for (const side of [Math.PI / 2, -Math.PI / 2]) {
    const outline = [
      ...arc(0, 0, radius, side - half, side + half, STEPS),
      ...arc(0, 0, radius - wall, side + half, side - half, STEPS),
    ]
    addPrism(builder, { outline, from: skirtBottom, to: beltBottom, axis: 'y' })
  }
}

function addBosses(builder: MeshBuilder, size: PistonSize, smallEndHalf: number) {
  const { pinRadius, beltBottom, bossFace } = size
  const eye = 1.5 * pinRadius
  const half = 1.9 * pinRadius
  const lean = Math.atan2(half - eye, beltBottom)
  const inner = Math.min(smallEndHalf + 0.02 * size.bore, 0.9 * bossFace)
  const outline = [
    ...arc(0, 0, eye, Math.PI + lean, 2 * Math.PI - lean, 32),
    ...through([half, beltBottom], [-half, beltBottom]),
  ]
  for (const [from, to] of [
    [-bossFace, -inner],
    [inner, bossFace],
  ]) {
    addPrism(builder, { outline, from, to })
  }
}

/** A hollow pin; a crosshead's is solid. */
export function addPistonPin(builder: MeshBuilder, size: PistonSize) {
  const { pinRadius, pinHalf, rodLength } = size
  addLathe(builder, {
    profile: tubeProfile(rodLength > 0 ? 0 : pinBoreOf(size), pinRadius, -pinHalf, pinHalf),
    axis: 'z',
    steps: rodLength > 0 ? 32 : 20,
    specAt: () => ({ fill: 'metal' }),
  })
}

/** Rings stand a hair proud of the lands, so that their two edges are drawn, and run down into the metal. */
export function addRings(builder: MeshBuilder, size: PistonSize) {
  const { bore, radius, crown, beltBottom, rings } = size
  const room = Math.min(crown - beltBottom, 0.3 * bore)
  const pitch = room / (rings + 1.2)
  const half = 0.21 * pitch
  const proud = 1.003 * radius
  for (let i = 0; i < rings; i++) {
    const middle = crown - pitch * (i + 1.1)
    addLathe(builder, {
      profile: through([0.96 * radius, middle], [proud, middle - half], [proud, middle + half]),
      steps: STEPS,
      specAt: () => ({ fill: 'metal' }),
    })
  }
}

/** The piston rod with its foot on the crosshead pin, and the crosshead's two guide shoes. */
function addPistonRod(builder: MeshBuilder, size: PistonSize) {
  const radius = 0.16 * size.bore
  const foot = 1.25 * size.pinRadius
  addLathe(builder, {
    profile: through(
      [0, 0.9 * size.pinRadius],
      [1.7 * radius, 0.9 * size.pinRadius],
      [1.7 * radius, foot],
      [radius, foot],
      [radius, size.beltBottom],
      [0, size.beltBottom],
    ),
    steps: 32,
  })
  const shoe = 0.62 * size.bore
  const outline = rectangle(-shoe, -shoe, shoe, shoe)
  for (const [from, to] of [
    [-size.pinHalf, -0.66 * size.pinHalf],
    [0.66 * size.pinHalf, size.pinHalf],
  ]) {
    addPrism(builder, { outline, holes: [circle(0, 0, 1.01 * size.pinRadius, 32)], from, to })
  }
}
