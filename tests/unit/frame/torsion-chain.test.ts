import { describe, expect, it } from 'vitest'
import { holzer } from '@/lib/mechanics/torsion/holzer'
import { shaftModes } from '@/lib/mechanics/torsion/shaft-modes'
import { STEEL_SHEAR } from '@/lib/mechanics/torsion/shaft-stiffness'
import { throwStiffness } from '@/lib/mechanics/torsion/throw-stiffness'
import { circle, rectangle } from '@/scene/frame/mesh/outline'
import { polarArea } from '@/scene/frame/mesh/polar-area'
import { stiffnessesByThrow, stiffnessesOf, torsionChain } from '@/scene/frame/torsion-chain'
import { missingWords, torsionAssumptions } from '@/scene/frame/torsion-words'
import type { CrankTrain } from '@/scene/model/crank-train'
import { presetById, presets } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'

const documentOf = (id: string) => presetById(id)!.train
const chainOf = (document: CrankTrain) => torsionChain(document, toTrain(document))

describe('polarArea(outline)', () => {
  it('is bh(b² + h²)/12 of a rectangle about its middle, and moves by the square of the distance', () => {
    expect(polarArea(rectangle(-2, -1, 2, 1))).toBeCloseTo((8 * (16 + 4)) / 12, 12)
    expect(polarArea(rectangle(1, -1, 5, 1))).toBeCloseTo((8 * (16 + 4)) / 12 + 8 * 9, 12)
    expect(polarArea(circle(0, 0, 1, 4096)) / (Math.PI / 2)).toBeCloseTo(1, 5)
  })
})

describe('torsionChain(document, train)', () => {
  it('runs from the free end over the throws by their place to the flywheel', () => {
    const { stations, stationOf, missing } = chainOf(documentOf('v8x-5000'))
    expect(stations.map(({ name }) => name)).toEqual([
      'free end',
      'throw 1',
      'throw 2',
      'throw 3',
      'throw 4',
      'flywheel',
    ])
    const document = documentOf('v8x-5000')
    expect(stationOf).toEqual(document.cylinders.map((cylinder) => Number(cylinder.throw)))
    expect(missing).toEqual({ inertias: [], sizes: [] })
    // heavier outer throws: that is where its counterweights sit
    expect(stations[1].inertia!).toBeGreaterThan(stations[2].inertia!)
    expect(stations[5].inertia!).toBeGreaterThan(document.inertia!.flywheelKgM2!)
  })

  it('has the stiffness of a whole throw between two throws with a main between them', () => {
    const document = documentOf('i4-2000')
    const [, first, second] = stiffnessesOf(chainOf(document).twists!, STEEL_SHEAR)
    const shape = document.shape!
    const metres = (mm: number | undefined) => mm! / 1000
    const wanted = throwStiffness(
      {
        mainDia: metres(shape.mainDiaMm),
        mainBore: 0,
        mainLength: metres(shape.mainLengthMm),
        pinDia: metres(shape.pinDiaMm),
        pinBore: metres(shape.pinBoreMm),
        pinLength: metres(shape.pinLengthMm),
        webThickness: metres(shape.webThicknessMm),
        webWidth: metres(shape.webWidthMm),
        radius: metres(document.cylinderDefaults.strokeMm) / 2,
      },
      STEEL_SHEAR,
    )
    expect(first / wanted).toBeCloseTo(1, 6)
    expect(second / wanted).toBeCloseTo(1, 6)
  })

  // rough first frequencies of these cranks, Hz: common practice, worked out by other means
  it.each([
    ['p2-270-700', 854],
    ['i3-1000', 420],
    ['i4-2000', 375],
    ['i5-2500', 331],
    ['i6-3000', 279],
    ['i6d-12800', 168],
    ['m6-2t-520', 20],
    ['v6-60-3000', 476],
    ['v8x-5000', 351],
    ['v12-60-6000', 286],
    ['b4-2000', 600],
  ])('gives %s a first frequency within a fifth of %d Hz', (id, rough) => {
    const { stations, twists } = chainOf(documentOf(id))
    const [{ frequency }] = shaftModes({
      inertias: stations.map(({ inertia }) => inertia!),
      stiffnesses: stiffnessesOf(twists!, STEEL_SHEAR),
    })
    expect(Math.abs(frequency / (2 * Math.PI) / rough - 1)).toBeLessThan(0.2)
  })

  it.each(presets.map(({ id }) => id))(
    'of %s leaves no torque over in Holzer’s table at any frequency',
    (id) => {
      const { stations, twists } = chainOf(documentOf(id))
      const chain = {
        inertias: stations.map(({ inertia }) => inertia!),
        stiffnesses: stiffnessesOf(twists!, STEEL_SHEAR),
      }
      for (const { frequency } of shaftModes(chain)) {
        const { residual, torques } = holzer(chain, frequency)
        expect(Math.abs(residual) / Math.max(...torques.map(Math.abs))).toBeLessThan(1e-7)
      }
    },
  )

  it('says what is missing and guesses none of it', () => {
    const document = documentOf('i4-2000')
    const { inertia: _, shape, ...bare } = document
    const without = chainOf({ ...bare, shape: { ...shape, webWidthMm: undefined } })
    expect(without.missing).toEqual({
      inertias: ['inertia.freeEndKgM2', 'inertia.flywheelKgM2'],
      sizes: ['shape.webWidthMm'],
    })
    expect(without.stations.map(({ inertia }) => inertia === null)).toEqual([
      true,
      false,
      false,
      false,
      false,
      true,
    ])
    expect([without.twists, without.kerWilson]).toEqual([null, null])
    // the crank's own metal is then left out of the throws, and that is said
    expect(without.stations[2].inertia!).toBeLessThan(chainOf(document).stations[2].inertia!)
    const codes = torsionAssumptions(without, { stiffnesses: 'by-throw', inertias: 'document' })
    expect(codes.map(({ code }) => code)).toContain('no-crank-bodies')
    for (const path of [...without.missing.inertias, ...without.missing.sizes])
      expect(missingWords(path)).not.toBe(path)
  })

  it('a zero inertia of an end is missing too', () => {
    const document = documentOf('i4-2000')
    const { missing } = chainOf({ ...document, inertia: { ...document.inertia, freeEndKgM2: 0 } })
    expect(missing.inertias).toEqual(['inertia.freeEndKgM2'])
  })

  it('one stiffness for every throw puts half a throw at either end', () => {
    expect(stiffnessesByThrow(3, 5)).toEqual([10, 5, 5, 10])
    expect(stiffnessesByThrow(1, 5)).toEqual([10, 10])
  })
})

describe('torsionAssumptions(chain, source)', () => {
  it('names the shear modulus and the formula only where they are used', () => {
    const chain = chainOf(documentOf('i4-2000'))
    const words = (stiffnesses: { shear: number } | 'given') =>
      torsionAssumptions(chain, { stiffnesses, inertias: 'document' })
        .map(({ message }) => message)
        .join(' ')
    expect(words({ shear: 81.5e9 })).toMatch(/from memory.*81\.5 GPa.*Ker Wilson’s.*13 % softer/)
    expect(words('given')).not.toMatch(/GPa|Carter/)
  })
})
