import { describe, expect, it } from 'vitest'
import {
  criticalsSentence,
  lackingSentence,
  metFirst,
  placeWords,
  shownOrders,
  spaced,
  speedRulers,
  strongest,
  type Critical,
} from '@/components/loads/torsion-words'
import { toSi } from '@/lib/units/units'

const rpm = (value: number) => toSi(value, 'rpm')
const critical = (
  order: number,
  speedRpm: number,
  place: Critical['place'],
  vectorSum: number,
): Critical => ({
  order,
  mode: 0,
  speed: rpm(speedRpm),
  place,
  vectorSum,
})
const criticals = [
  critical(2, 12_000, 'outside', 3.9),
  critical(3.5, 6857, 'near', 0.4),
  critical(4, 6000, 'inside', 3.5),
  critical(4.5, 5333, 'inside', 0.5),
]
const range = { from: rpm(800), to: rpm(6500) }

describe('torsion words', () => {
  it('placeWords tells by a shape and a word', () => {
    expect((['inside', 'near', 'outside', null] as const).map(placeWords)).toEqual([
      '◆ in the range',
      '◇ near it',
      'outside',
      '–',
    ])
  })
  it('strongest leaves out those outside and begins with the most fed', () => {
    expect(strongest(criticals).map(({ order }) => order)).toEqual([4, 4.5, 3.5])
  })
  it('metFirst keeps the order of the orders on either side', () => {
    expect(metFirst(criticals).map(({ order }) => order)).toEqual([3.5, 4, 4.5, 2])
  })
  it('spaced drops what stands too near to an earlier one of its mode', () => {
    const kept = (apart: number) => spaced(criticals, rpm(apart)).map(({ order }) => order)
    expect(kept(700)).toEqual([2, 3.5, 4])
    expect(kept(1000)).toEqual([2, 3.5, 4.5])
    const other = { ...criticals[2], mode: 1 }
    expect(spaced([criticals[2], other], rpm(700))).toEqual([criticals[2], other])
  })
  it('shownOrders are those of the strongest, ascending; the highest where none is met', () => {
    expect(shownOrders(criticals, 2)).toEqual([4, 4.5])
    expect(shownOrders(criticals.slice(0, 1), 2)).toEqual([2])
  })
  it('criticalsSentence counts, names the most fed, and says when it cannot tell', () => {
    expect(criticalsSentence(criticals, range, 4)).toBe(
      '3 lie from 680 to 7,475 rpm, 0.85 of the lowest to 1.15 of the greatest running speed; 2 of them in the running range itself. By their vectors alone the cylinders feed order 4 with mode 1 at 6,000 rpm most: they add up to 3.50 of 4.',
    )
    expect(criticalsSentence(criticals.slice(0, 1), range, 4)).toMatch(/^None lies from 680 to 7,475 rpm/)
    expect(criticalsSentence(criticals, null, 4)).toMatch(/Neither a maximum nor a rated speed/)
  })
  it('lackingSentence lists what is to be entered, and where', () => {
    expect(lackingSentence(['inertia.flywheelKgM2'])).toBe(
      'Missing: the inertia of the flywheel. Enter it in the parts list.',
    )
    expect(lackingSentence(['shape.pinDiaMm', 'shape.webWidthMm'], 'a stiffness')).toBe(
      'Missing: the diameter of the pins and the width of the webs. Enter them in the parts list, or a stiffness.',
    )
  })
  it('speedRulers put two speeds at one place under one name', () => {
    expect(speedRulers({ idle: rpm(800), rated: rpm(6000), max: rpm(6000) })).toEqual([
      { x: 800, text: 'idle' },
      { x: 6000, text: 'rated and max' },
    ])
    expect(speedRulers({})).toEqual([])
  })
})
