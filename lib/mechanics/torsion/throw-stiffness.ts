import { polarMoment } from './shaft-stiffness'

/** Sizes of a crank as its twist goes by them, m; the bores are 0 where it is solid. */
export interface CrankSizes {
  mainDia: number
  mainBore: number
  pinDia: number
  pinBore: number
  webWidth: number
}

/** One throw from the middle of a main to the middle of the next, m. */
export interface ThrowSizes extends CrankSizes {
  mainLength: number
  pinLength: number
  webThickness: number
  radius: number
}

/*
 * Carter’s equivalent length, from memory: Le/D⁴ = (Lm + 0.8·t)/(Dm⁴ − dm⁴) + 0.75·Lp/(Dp⁴ − dp⁴) + 1.5·R/(t·w³),
 * taken apart into main, pin and web (two to a throw) so that a crank adds up of whatever stands along it. Each part
 * is length ÷ polar moment, 1/m³; G ÷ their sum is the stiffness, N m/rad.
 */

export const mainTwist = (length: number, { mainDia, mainBore }: CrankSizes): number =>
  length / polarMoment(mainDia, mainBore)

export const pinTwist = (length: number, { pinDia, pinBore }: CrankSizes): number =>
  (0.75 * length) / polarMoment(pinDia, pinBore)

/** A web of this thickness that joins a main to a pin `arm` away: half of Carter’s two webs. */
export const webTwist = (thickness: number, arm: number, sizes: CrankSizes): number =>
  mainTwist(0.4 * thickness, sizes) + armTwist(0.75 * arm, thickness, sizes)

/** A web between two pins `arm` apart: the same, with no main to reach into (an extension, not Carter’s). */
export const flyingWebTwist = (thickness: number, arm: number, sizes: CrankSizes): number =>
  pinTwist(0.4 * thickness, sizes) + armTwist(0.75 * arm, thickness, sizes)

const armTwist = (length: number, thickness: number, { webWidth }: CrankSizes) =>
  (32 / Math.PI) * (length / (thickness * webWidth ** 3))

/** Stiffness of a throw by Carter’s formula (from memory), N m/rad; G shear modulus, Pa. Sizes above 0. */
export const throwStiffness = (sizes: ThrowSizes, shear: number): number =>
  shear /
  (mainTwist(sizes.mainLength, sizes) +
    pinTwist(sizes.pinLength, sizes) +
    2 * webTwist(sizes.webThickness, sizes.radius, sizes))

/**
 * The same by Ker Wilson’s formula (from memory), for comparison: Le/D⁴ = (Lm + 0.4·Dm)/(Dm⁴ − dm⁴) +
 * (Lp + 0.4·Dp)/(Dp⁴ − dp⁴) + (R − 0.2·(Dm + Dp))/(t·w³). Null where pin and main overlap so far that the last part is
 * below 0: the formula does not hold there.
 */
export function kerWilsonStiffness(sizes: ThrowSizes, shear: number): number | null {
  const { mainLength, mainDia, mainBore, pinLength, pinDia, pinBore, radius, webThickness, webWidth } = sizes
  const arm = radius - 0.2 * (mainDia + pinDia)
  if (arm < 0) return null
  const sum =
    (mainLength + 0.4 * mainDia) / polarMoment(mainDia, mainBore) +
    (pinLength + 0.4 * pinDia) / polarMoment(pinDia, pinBore) +
    (32 / Math.PI) * (arm / (webThickness * webWidth ** 3))
  return shear / sum
}
