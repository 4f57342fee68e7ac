import { describe, expect, it } from 'vitest'
import { pistonHeight } from '@/lib/mechanics/link-rod'
import { rodPaths } from '@/lib/mechanics/rod-path'
import { pistonPosition, rodAngle } from '@/lib/mechanics/slider-crank'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { presetRig, presetRigs, randomRigs, type Built } from './rigs'

const angles = [0, 0.3, 1.1, 2.2, 3.9, 5.7, 9.4, -2]

const at = (pose: Float64Array, part: number, x: number, y: number) => [
  pose[4 * part] * x - pose[4 * part + 1] * y + pose[4 * part + 2],
  pose[4 * part + 1] * x + pose[4 * part] * y + pose[4 * part + 3],
]

const partOf = ({ rig }: Built, id: string) => rig.parts.findIndex((part) => part.id === id)

describe('fillPose(out, rig, angle)', () => {
  it('puts every piston pin where the kernel does, to 1e-12 of its height', () => {
    for (const engine of [...presetRigs(), ...randomRigs(20)]) {
      const { train, rig, name } = engine
      const pose = buildPose(rig)
      const paths = rodPaths(train)
      let worst = 0
      for (const angle of angles) {
        fillPose(pose, rig, angle)
        train.cylinders.forEach((cylinder, i) => {
          const bank = train.banks[cylinder.bank].angle
          const { part } = rig.anchors.crown[i]
          const horizontal = rig.mirror * pose[4 * part + 2]
          const vertical = pose[4 * part + 3]
          const height = vertical * Math.cos(bank) + horizontal * Math.sin(bank)
          const aside = horizontal * Math.cos(bank) - vertical * Math.sin(bank)
          const gap = Math.hypot(height - pistonHeight(paths, i, angle), aside - cylinder.offset)
          worst = Math.max(worst, gap / height)
        })
      }
      expect(worst, name).toBeLessThan(1e-12)
    }
  })

  it('leans a plain rod by the kernel’s rod angle', () => {
    const engine = presetRig('i3-1000')
    const { train, rig } = engine
    const pose = buildPose(rig)
    for (const angle of angles) {
      fillPose(pose, rig, angle)
      train.cylinders.forEach(({ id, throw: own, rodLength, offset }) => {
        const { radius, angle: phase } = train.throws[own]
        const part = partOf(engine, `rod:${id}`)
        const lean = rodAngle(angle + phase, radius, rodLength, offset)
        expect(pose[4 * part]).toBeCloseTo(Math.cos(lean), 12)
        expect(pose[4 * part + 1]).toBeCloseTo(rig.mirror * Math.sin(lean), 12)
        expect(pose[4 * part + 3]).toBeCloseTo(radius * Math.cos(angle + phase), 12)
        expect(pistonPosition(angle + phase, radius, rodLength, offset)).toBeGreaterThan(0)
      })
    }
  })

  it('keeps rods rigid: both eyes meet their pins to 1e-12, a link rod’s on its master', () => {
    for (const engine of presetRigs()) {
      const { train, rig, name } = engine
      const pose = buildPose(rig)
      let worst = 0
      const meet = ([x, y]: number[], [otherX, otherY]: number[], length: number) => {
        worst = Math.max(worst, Math.hypot(x - otherX, y - otherY) / length)
      }
      for (const angle of angles) {
        fillPose(pose, rig, angle)
        for (const { id, rodLength, throw: own, link } of train.cylinders) {
          const rod = partOf(engine, `rod:${id}`)
          meet(at(pose, rod, 0, rodLength), at(pose, partOf(engine, `piston:${id}`), 0, 0), rodLength)
          const pin = link
            ? at(
                pose,
                partOf(engine, `rod:${train.cylinders[link.master].id}`),
                rig.mirror * link.knuckleRadius * Math.sin(link.knuckleAngle),
                link.knuckleRadius * Math.cos(link.knuckleAngle),
              )
            : at(pose, partOf(engine, `crank-pin:${train.throws[own].id}`), 0, train.throws[own].radius)
          meet(at(pose, rod, 0, 0), pin, rodLength)
          worst = Math.max(worst, Math.abs(Math.hypot(pose[4 * rod], pose[4 * rod + 1]) - 1))
        }
      }
      expect(worst, name).toBeLessThan(1e-12)
    }
  })

  it('turns a balance shaft at its own speed about its own axis', () => {
    const engine = randomRigs(20).find(({ train }) => train.balanceShafts.length > 1)!
    const { train, rig } = engine
    const pose = fillPose(buildPose(rig), rig, 0.7)
    for (const { id, angle, speedRatio, horizontal, vertical } of train.balanceShafts) {
      const part = partOf(engine, `balance-shaft:${id}`)
      const heavy = at(pose, part, 0, 1)
      const turned = angle + speedRatio * 0.7
      expect(heavy[0]).toBeCloseTo(rig.mirror * (horizontal + Math.sin(turned)), 12)
      expect(heavy[1]).toBeCloseTo(vertical + Math.cos(turned), 12)
    }
  })

  it('is clockwise seen from the free end when the document says so', () => {
    const { rig } = presetRig('single-450')
    const pin = rig.parts.findIndex(({ kind }) => kind === 'crank-pin')
    const before = at(fillPose(buildPose(rig), rig, 0), pin, 0, 1)
    const after = at(fillPose(buildPose(rig), rig, 0.1), pin, 0, 1)
    // an eye at the free end looking along +z has −x on its right
    expect(-after[0]).toBeGreaterThan(-before[0])
    expect(before[1]).toBeCloseTo(1, 12)
  })
})
