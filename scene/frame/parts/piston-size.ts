import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import { STEEL, type Shape } from '../shape'

/** One piston in metres; y is up its cylinder from the piston pin. */
export interface PistonSize {
  bore: number
  radius: number
  crown: number
  beltBottom: number
  skirtBottom: number
  pinRadius: number
  pinHalf: number
  /** Faces of the pin bosses: from the rod's small end to the outside of the piston. */
  bossFace: number
  rings: number
  /** A crosshead carries the piston on a rod of this length above the pin; 0 for a trunk piston. */
  rodLength: number
}

const PIN_BORE = 0.6

/** Longer strokes than this many bores cannot be had with a trunk piston: the rod would foul the bore. */
const TRUNK_LIMIT = 1.9

export function pistonSize(document: CrankTrain, train: Train, shape: Shape, index: number): PistonSize {
  const { bore, throw: own } = train.cylinders[index]
  const stroke = 2 * train.throws[own].radius
  const crosshead = stroke > TRUNK_LIMIT * bore
  const compression = Math.max(shape.compressionHeight, 0.16 * bore)
  const pinHalf = 0.37 * bore
  const pinRadius = crosshead
    ? 0.8 * shape.pinRadius
    : Math.min(pinRadiusFor(document, index, pinHalf, bore), 0.42 * compression)
  const rodLength = crosshead ? stroke + 3.2 * pinRadius : 0
  const crown = rodLength + compression
  return {
    bore,
    radius: 0.494 * bore,
    crown,
    beltBottom: crosshead ? rodLength - 0.15 * bore : Math.min(1.2 * pinRadius, 0.6 * compression),
    skirtBottom: crosshead ? rodLength - 0.15 * bore : -Math.max(shape.skirtBelowPin, 0.06 * bore),
    pinRadius,
    pinHalf: crosshead ? 0.62 * bore : pinHalf,
    bossFace: 0.365 * bore,
    rings: crosshead ? 4 : 3,
    rodLength,
  }
}

/** The pin's outside from its mass as a steel tube, kept between what pistons carry (common practice). */
function pinRadiusFor(document: CrankTrain, index: number, half: number, bore: number): number {
  const mass = document.cylinders[index].pistonPinKg ?? document.masses.pistonPinKg
  const radius = Math.sqrt(mass / (STEEL * Math.PI * (1 - PIN_BORE * PIN_BORE) * 2 * half))
  return Math.min(Math.max(radius || 0.12 * bore, 0.105 * bore), 0.2 * bore)
}

export const pinBoreOf = (size: PistonSize) => PIN_BORE * size.pinRadius
