import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { massSplit } from '@/lib/mechanics/balance'
import { compareTrains, differences, type Compared } from '@/scene/model/compare-trains'
import { equalised } from '@/scene/model/equalised'
import { presetById, presets } from '@/scene/model/presets'
import { readTrain } from '@/scene/model/read-train'
import { scaledDocument, similarityFactor } from '@/scene/model/scaled-document'
import { toTrain } from '@/scene/model/to-train'

const train = (id: string) => presetById(id)!.train
const at = (speedRpm: number, ...ids: string[]): Compared[] =>
  ids.map((id) => ({ document: train(id), speedRpm }))
const v8s = at(7000, 'v8x-5000', 'v8f-4200')
const rpm = Math.PI / 30

const valuesOf = (compared: Compared[], group: string, name: string) =>
  compareTrains(compared)
    .find(({ title }) => title === group)!
    .rows.find((row) => row.name === name)!.values

/** Peak force and torque of inertia alone, and of gas alone. */
function peaks({ document, speedRpm }: Compared) {
  const { shaking, torque } = analyse(toTrain(document), { speed: speedRpm * rpm })
  const most = (values: number[]) => Math.max(...values.map(Math.abs))
  return {
    inertia: most(shaking!.verticalN),
    gas: most(torque!.gasNm),
    inertiaTorque: most(torque!.inertiaNm),
  }
}

describe('compareTrains, a cross-plane beside a flat-plane V8 at equal 7,000 rpm and equal displacement', () => {
  // TRADE 13, story B: common practice
  const pair = equalised(v8s, { size: 'displacement', speed: 'rpm' })

  it('both fire every 90°, so the intervals are no difference; their banks are', () => {
    expect(valuesOf(pair, 'Firing', 'Intervals')).toEqual(['every 90°, 8 times', 'every 90°, 8 times'])
    const firing = differences(compareTrains(pair), 'si').find(({ title }) => title === 'Firing')!
    expect(firing.rows.map(({ name }) => name)).not.toContain('Intervals')
    const [cross, flat] = firing.rows.find(({ name }) => name === 'Bank A')!.texts
    expect(cross.replace('°', '').split('-').map(Number).sort()).toEqual([180, 180, 270, 90])
    expect(flat).toBe('every 180°, 4 times')
  })

  it('the second order is nothing against 4 root 2 F2 across', () => {
    const [cross, flat] = valuesOf(pair, 'Shaking', 'Second order, horizontal') as number[]
    expect(cross).toBe(0)
    const scaled = toTrain(pair[1].document)
    const [one] = scaled.cylinders
    const radius = scaled.throws[one.throw].radius
    const ratio = radius / one.rodLength
    const primary = massSplit(one).reciprocating * radius * (7000 * rpm) ** 2
    // second-order coefficient of the exact series: ratio + ratio³/4 + 15 ratio⁵/128
    const second = primary * (ratio + ratio ** 3 / 4 + (15 * ratio ** 5) / 128)
    expect(flat / (4 * Math.SQRT2 * second)).toBeCloseTo(1, 4)
    expect(flat / (4 * Math.SQRT2 * primary * ratio)).toBeCloseTo(1, 1)
    expect(valuesOf(pair, 'Shaking', 'Second order, vertical')).toEqual([0, 0])
  })

  it('the heaviest counterweight as drawn: 103 against 35 oz in', () => {
    const heaviest = 'Heaviest, mass × radius'
    const texts = differences(compareTrains(v8s), 'us')
      .find(({ title }) => title === 'Counterweights')!
      .rows.find(({ name }) => name === heaviest)!
      .texts.map(Number)
    // handbook figures of the same engines, 97.1 and 35.1 oz in (TRADE 8.5): they place the webs' own unbalance otherwise
    expect(Math.abs(texts[0] / 97.1 - 1)).toBeLessThan(0.07)
    expect(Math.abs(texts[1] / 35.1 - 1)).toBeLessThan(0.01)
    // the flat-plane crank brought to the same displacement: its counterweights grow as the fourth power
    const equal = valuesOf(pair, 'Counterweights', heaviest) as number[]
    const drawn = valuesOf(v8s, 'Counterweights', heaviest) as number[]
    expect(equal[1] / drawn[1]).toBeCloseTo(similarityFactor(4199, 5001) ** 4, 3)
  })

  it('nothing differs between an engine and itself', () => {
    expect(differences(compareTrains(at(7000, 'v8x-5000', 'v8x-5000')), 'si')).toEqual([])
  })

  it('a difference below what is shown is none, and one above it is one', () => {
    const document = train('v8x-5000')
    const wider = (by: number): Compared => ({
      document: {
        ...document,
        cylinderDefaults: { ...document.cylinderDefaults, boreMm: document.cylinderDefaults.boreMm! + by },
      },
      speedRpm: 7000,
    })
    const bores = (by: number) =>
      differences(compareTrains([v8s[0], wider(by)]), 'si')
        .flatMap(({ rows }) => rows)
        .find(({ name }) => name === 'Bore')
    expect(bores(0.01)).toBeUndefined()
    expect(bores(0.1)?.texts).toEqual(['95.0', '95.1'])
  })

  it('figures of a row share one unit', () => {
    const rows = differences(compareTrains(at(6000, 'i4-2000', 'i6-3000')), 'si').flatMap(({ rows }) => rows)
    const second = rows.find(({ name }) => name === 'Second order, vertical')!
    expect(second.unit).toBe('kN')
    expect(second.texts[1]).toBe('0.00')
  })

  it('every preset can stand beside every other', () => {
    const all = presets.map(({ train: document }) => ({
      document,
      speedRpm: document.operating!.ratedRpm!,
    }))
    for (const { rows } of compareTrains(all))
      for (const { values } of rows) {
        expect(values).toHaveLength(presets.length)
        for (const value of values) if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true)
      }
  })
})

describe('scaledDocument', () => {
  it.each(presets.map(({ id, train: document }) => [id, document] as const))(
    'scaledDocument(%s, 1.25) runs, is 1.25³ in volume and goes back to the same engine',
    (_, document) => {
      const larger = scaledDocument(document, 1.25)
      expect(readTrain(larger).ok).toBe(true)
      const volume = (of: typeof document) =>
        analyse(toTrain(of), { speed: 0, include: [] }).train.displacementCc
      expect(volume(larger) / volume(document)).toBeCloseTo(1.25 ** 3, 9)
      const back = analyse(toTrain(scaledDocument(larger, 0.8)), { speed: 100, stepDeg: 10 })
      const first = analyse(toTrain(document), { speed: 100, stepDeg: 10 })
      back.shaking!.verticalN.forEach((force, i) =>
        expect(Math.abs(force - first.shaking!.verticalN[i])).toBeLessThan(1e-8 * (1 + Math.abs(force))),
      )
    },
  )

  it('obeys the rules of similarity: inertia as the fourth power at equal speed, gas moment as the third', () => {
    const [small, large] = [1, 1.5].map((factor) =>
      peaks({ document: scaledDocument(train('i4-2000'), factor), speedRpm: 6000 }),
    )
    expect(large.inertia / small.inertia).toBeCloseTo(1.5 ** 4, 8)
    expect(large.gas / small.gas).toBeCloseTo(1.5 ** 3, 5)
    expect(large.inertiaTorque / small.inertiaTorque).toBeCloseTo(1.5 ** 5, 8)
  })

  it('at equal mean piston speed forces grow as the square', () => {
    const small = { document: train('i4-2000'), speedRpm: 6000 }
    const large = { document: scaledDocument(train('i4-2000'), 1.5), speedRpm: 1 }
    const [, equal] = equalised([small, large], { size: 'own', speed: 'piston-speed' })
    expect(equal.speedRpm).toBeCloseTo(4000, 6)
    expect(peaks(equal).inertia / peaks(small).inertia).toBeCloseTo(1.5 ** 2, 8)
  })

  it.each([0, -1, NaN, Infinity])('scaledDocument(…, %s) throws', (factor) => {
    expect(() => scaledDocument(train('i4-2000'), factor)).toThrow(RangeError)
  })
})

describe('equalised', () => {
  it('leaves the first as it is and, where nothing is asked, all', () => {
    const pair = equalised(v8s, { size: 'displacement', speed: 'piston-speed' })
    expect(pair[0]).toBe(v8s[0])
    expect(equalised(v8s, { size: 'own', speed: 'own' })).toEqual(v8s)
  })
})
