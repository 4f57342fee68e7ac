import { describe, expect, it } from 'vitest'
import { buildInstant, fillInstant } from '@/lib/mechanics/plan'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { presetById } from '@/scene/model/presets'
import flatPlane from '@/scene/model/presets/v8f-4200.json'
import { toTrain } from '@/scene/model/to-train'
import { buildStageModel } from '@/scene/stage/build-stage-model'

const document = crankTrainSchema.parse(flatPlane)
const train = toTrain(document)
const speed = (6000 * 2 * Math.PI) / 60
const model = buildStageModel(document, train, speed)

describe('buildStageModel(document, train, speed)', () => {
  it('no force of the cycle is above its peak, and the orbit is the shaking force', () => {
    const instant = buildInstant(model.plan)
    for (let degree = 0; degree < 720; degree += 7) {
      fillInstant(instant, model.plan, (degree * Math.PI) / 180)
      for (const force of instant.gasForce) expect(Math.abs(force)).toBeLessThanOrEqual(model.peakForce)
      for (let i = 0; i < instant.crankPinVertical.length; i++)
        expect(Math.hypot(instant.crankPinVertical[i], instant.crankPinHorizontal[i])).toBeLessThanOrEqual(
          model.peakForce * (1 + 1e-12),
        )
      for (const pressure of instant.pressure) expect(pressure).toBeLessThanOrEqual(model.peakPressure * 1.01)
      expect(model.orbit[2 * degree]).toBeCloseTo(instant.shakingVertical, 6)
      expect(model.orbit[2 * degree + 1]).toBeCloseTo(instant.shakingHorizontal, 6)
    }
  })

  it('eight events in the order of the document', () => {
    const ids = model.events.map(({ cylinder }) => train.cylinders[cylinder].id)
    const first = ids.indexOf(document.firingOrder[0])
    expect([...ids.slice(first), ...ids.slice(0, first)]).toEqual(document.firingOrder)
  })

  it('another speed keeps the rig, another document does not', () => {
    expect(buildStageModel(document, train, 2 * speed).rig).toBe(model.rig)
    const other = { ...document, title: 'Other' }
    expect(buildStageModel(other, toTrain(other), speed).rig).not.toBe(model.rig)
  })

  it('a couple that is next to nothing is next to no arc, and one that rocks the engine a full one', () => {
    const largestShare = (id: string) => {
      const { train: document } = presetById(id)!
      const model = buildStageModel(document, toTrain(document), speed)
      const instant = buildInstant(model.plan)
      let most = 0
      for (let degree = 0; degree < 720; degree++) {
        fillInstant(instant, model.plan, (degree * Math.PI) / 180)
        most = Math.max(most, Math.hypot(instant.coupleVertical, instant.coupleHorizontal))
      }
      return most / model.fullCouple
    }
    expect(largestShare('v8x-5000')).toBeLessThan(0.02)
    expect(largestShare('i3-1000')).toBeCloseTo(1, 6)
  })
})
