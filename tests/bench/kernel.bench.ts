import { bench, describe } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import type { Instant } from '@/lib/mechanics/instant'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import type { Train } from '@/lib/mechanics/train'
import { presets } from '@/scene/model/presets'
import { readTrain } from '@/scene/model/read-train'

// Wanted on two cores: a whole analysis of an 8-cylinder four-stroke at 1° in less than 8 ms, growing with
// cylinders × angles. Ratios to the bare loop are between lines of one group.

const documentOf = (id: string) => presets.find((preset) => preset.id === id)!.train
const trainOf = (id: string): Train => {
  const read = readTrain(documentOf(id))
  if (!read.ok) throw new Error(`${id} does not read`)
  return read.train
}
const speedOf = (train: Train) => train.operating.rated!

/** What a bench computed must be what the same call gives afterwards. */
const same = (name: string, one: number, other: number) => {
  if (!Number.isFinite(one) || one !== other) throw new Error(`${name}: ${one} is not ${other}`)
}

const v8 = trainOf('v8x-5000')
const angles = Float64Array.from({ length: 720 }, (_, k) => (k * Math.PI) / 180)

describe('one cycle of 8 cylinders at 1°', () => {
  const motion = bareLoop(v8)
  bench('motion alone, a bare loop over typed arrays', () => void motion(), {
    teardown: () => same('motion', motion(), motion()),
  })

  for (const [name, train] of [
    ['without gas', { ...v8, gas: { model: 'none' as const } }],
    ['with heat release', v8],
  ] as const) {
    const plan = buildPlan(train, speedOf(v8))
    const instant = buildInstant(plan)
    const cycle = () => {
      let sum = 0
      for (const angle of angles) {
        fillInstant(instant, plan, angle)
        sum += checksum(instant)
      }
      return sum
    }
    bench(`fillInstant ${name}`, () => void cycle(), { teardown: () => same(name, cycle(), cycle()) })
  }
})

const checksum = (instant: Instant) =>
  instant.shakingVertical + instant.coupleHorizontal + instant.gasTorque + instant.mainVertical[1]

/** Position, velocity and acceleration of every piston at every angle, and nothing else. */
function bareLoop({ cylinders, throws, banks }: Train) {
  const count = cylinders.length
  const out = new Float64Array(3 * count)
  const phase = Float64Array.from(cylinders, (one) => throws[one.throw].angle - banks[one.bank].angle)
  const radius = Float64Array.from(cylinders, (one) => throws[one.throw].radius)
  const length = Float64Array.from(cylinders, (one) => one.rodLength)
  const offset = Float64Array.from(cylinders, (one) => one.offset)
  return () => {
    let sum = 0
    for (const angle of angles) {
      for (let i = 0; i < count; i++) {
        const u = radius[i] * Math.cos(angle + phase[i])
        const v = radius[i] * Math.sin(angle + phase[i])
        const side = v - offset[i]
        const reach = Math.sqrt(length[i] * length[i] - side * side)
        const lean = side / reach
        out[3 * i] = u + reach
        out[3 * i + 1] = -v - u * lean
        out[3 * i + 2] = -u + v * lean - (u * u * (1 + lean * lean)) / reach
      }
      sum += out[0] + out[1] + out[2]
    }
    return sum
  }
}

describe('a whole analysis at 1°', () => {
  for (const id of ['single-450', 'i4-2000', 'v8x-5000', 'v12-60-6000', 'r7-11', 'm6-2t-520']) {
    const train = trainOf(id)
    const run = () => analyse(train, { speed: speedOf(train) })
    const sum = () => run().torque!.totalNm.reduce((total, torque) => total + torque, 0)
    bench(id, () => void run(), { teardown: () => same(id, sum(), sum()) })
  }
})

describe('what an edit waits for', () => {
  for (const id of ['v8x-5000', 'r7-11']) {
    const document = documentOf(id)
    const train = trainOf(id)
    bench(`readTrain ${id}`, () => void readTrain(document))
    bench(`buildPlan ${id}`, () => void buildPlan(train, speedOf(train)))
  }
})
