import FFT from 'fft.js'
import { describe, expect, it } from 'vitest'
import { answer } from '@/tests/support/mechanics/kernel'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'
import { randomTrain } from '@/tests/support/mechanics/random-train'

/** Samples a crank revolution: a power of two, so that a general fast transform takes them. */
const SAMPLES = 512
const DEG = Math.PI / 180

/** Amplitude-and-phase phasors A·e^(−i·phase) of a sampled cycle by a general fast Fourier transform, order 0 first. */
function phasors(signal: ArrayLike<number>) {
  const fft = new FFT(signal.length)
  const out = fft.createComplexArray() as number[]
  fft.realTransform(out, Array.from(signal))
  return Array.from({ length: signal.length / 2 }, (_, k) => [
    (2 * out[2 * k]) / signal.length,
    (2 * out[2 * k + 1]) / signal.length,
  ])
}

const phasor = (amplitude: number, phaseDeg: number) => [
  amplitude * Math.cos(phaseDeg * DEG),
  -amplitude * Math.sin(phaseDeg * DEG),
]

const apart = ([a, b]: number[], [c, d]: number[]) => Math.hypot(a - c, b - d)
const peakOf = (signal: ArrayLike<number>) => Math.max(...Array.from(signal, Math.abs))

const cases = [
  ...presetIds.map((id) => ({ name: id, document: preset(id), rpm: ratedRpm(preset(id)) })),
  ...[101, 102, 103].map((seed) => ({
    name: `random train ${seed}`,
    document: randomTrain(seed),
    rpm: 3000,
  })),
]

describe('orders of analyse(train, …) against a general fast Fourier transform', () => {
  it.each(cases)(
    '$name: shaking force and couple within 1e-9 of one cylinder’s inertia force',
    ({ document, rpm }) => {
      const { orders, shaking, loads } = answer(document, rpm, 360 / SAMPLES)
      const perTurn = document.cycle === 'four-stroke' ? 2 : 1
      const force = Math.max(...Object.values(loads).map((l) => peakOf(l.pistonPinN.u)))
      const arm = Math.max(0.1, ...document.cylinders.map((c) => Math.abs(c.axialMm) / 1000))
      const parts = [
        ['vertical', shaking.verticalN, 1],
        ['horizontal', shaking.horizontalN, 1],
        ['coupleVertical', shaking.coupleVerticalNm, arm],
        ['coupleHorizontal', shaking.coupleHorizontalNm, arm],
      ] as const
      for (const [name, signal, scale] of parts) {
        const wanted = phasors(signal)
        for (const o of orders) {
          const part = o[name]
          const amplitude = 'amplitudeN' in part ? part.amplitudeN : part.amplitudeNm
          const off = apart(phasor(amplitude, part.phaseDeg), wanted[Math.round(o.order * perTurn)])
          expect(off / (force * scale), `order ${o.order} ${name}`).toBeLessThan(1e-9)
        }
      }
    },
  )

  it.each(cases)(
    '$name: forward and backward parts are those of vertical + i·horizontal',
    ({ document, rpm }) => {
      const { orders, shaking } = answer(document, rpm, 360 / SAMPLES)
      const turns = document.cycle === 'four-stroke' ? 2 : 1
      const fft = new FFT(SAMPLES * turns)
      const [input, out] = [fft.createComplexArray() as number[], fft.createComplexArray() as number[]]
      for (let i = 0; i < SAMPLES * turns; i++) {
        input[2 * i] = shaking.verticalN[i]
        input[2 * i + 1] = shaking.horizontalN[i]
      }
      fft.transform(out, input)
      const size = (k: number) => Math.hypot(out[2 * k], out[2 * k + 1]) / (SAMPLES * turns)
      const peak = Math.max(peakOf(shaking.verticalN), peakOf(shaking.horizontalN), 1)
      for (const o of orders) {
        const k = Math.round(o.order * turns)
        expect(Math.abs(o.forwardN - size(k)) / peak, `order ${o.order} forward`).toBeLessThan(1e-9)
        expect(
          Math.abs(o.backwardN - size(SAMPLES * turns - k)) / peak,
          `order ${o.order} backward`,
        ).toBeLessThan(1e-9)
      }
    },
  )

  // Valves and burning bend the torque at a few angles, so its sampled transform is itself only good to some 1e-6.
  it.each(cases)('$name: torque amplitudes within 1e-5 of the peak torque', ({ document, rpm }) => {
    const { orders, torque } = answer(document, rpm, 360 / SAMPLES)
    const perTurn = document.cycle === 'four-stroke' ? 2 : 1
    const wanted = phasors(torque.totalNm)
    const peak = peakOf(torque.totalNm)
    for (const o of orders) {
      const [re, im] = wanted[Math.round(o.order * perTurn)]
      expect(Math.abs(o.torqueNm - Math.hypot(re, im)) / peak, `order ${o.order}`).toBeLessThan(1e-5)
    }
  })
})
