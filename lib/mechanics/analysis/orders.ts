import { fourierCoefficient, harmonicOf, unitCircle, type Complex } from '@/lib/numerics/fourier'
import type { Plan } from '../instant'
import { DEGREES, type Recorder, type Samples } from './recorder'

/** One order, per crank revolution: signal = Σ A·cos(kθ − phase); forward and backward |c_k| and |c_−k| of vertical + i·horizontal = Σ c_k e^(ikθ). */
export interface Order {
  order: number
  vertical: { amplitudeN: number; phaseDeg: number }
  horizontal: { amplitudeN: number; phaseDeg: number }
  forwardN: number
  backwardN: number
  coupleVertical: { amplitudeNm: number; phaseDeg: number }
  coupleHorizontal: { amplitudeNm: number; phaseDeg: number }
  forwardNm: number
  backwardNm: number
  torqueNm: number
}

/** The highest order that is told apart. */
export const HIGHEST = 12

/** Orders ½, 1, 1½ … 12 of a four-stroke, 1, 2 … 12 of a two-stroke, from all samples of the cycle. */
export function ordersRecorder(plan: Plan, { all }: Samples): Recorder<Order[]> {
  const turns = Math.round(plan.train.cycle / (2 * Math.PI))
  const array = () => new Float64Array(all)
  const [vertical, horizontal, coupleVertical, coupleHorizontal, torque] = Array.from({ length: 5 }, array)
  return {
    record(instant, sample) {
      vertical[sample] = instant.shakingVertical
      horizontal[sample] = instant.shakingHorizontal
      coupleVertical[sample] = instant.coupleVertical
      coupleHorizontal[sample] = instant.coupleHorizontal
      torque[sample] = instant.gasTorque + instant.inertiaTorque
    },
    answer() {
      const circle = unitCircle(all)
      return Array.from({ length: HIGHEST * turns }, (_, index): Order => {
        const bin = index + 1
        const of = (signal: Float64Array) => fourierCoefficient(signal, bin, circle)
        const [v, h, cv, ch] = [of(vertical), of(horizontal), of(coupleVertical), of(coupleHorizontal)]
        return {
          order: bin / turns,
          vertical: force(v),
          horizontal: force(h),
          forwardN: Math.hypot(v.re - h.im, v.im + h.re),
          backwardN: Math.hypot(v.re + h.im, h.re - v.im),
          coupleVertical: couple(cv),
          coupleHorizontal: couple(ch),
          forwardNm: Math.hypot(cv.re - ch.im, cv.im + ch.re),
          backwardNm: Math.hypot(cv.re + ch.im, ch.re - cv.im),
          torqueNm: harmonicOf(of(torque)).amplitude,
        }
      })
    },
  }
}

const force = (c: Complex) => {
  const { amplitude, phase } = harmonicOf(c)
  return { amplitudeN: amplitude, phaseDeg: phase * DEGREES }
}
const couple = (c: Complex) => {
  const { amplitude, phase } = harmonicOf(c)
  return { amplitudeNm: amplitude, phaseDeg: phase * DEGREES }
}
