import { describe, expect, it } from 'vitest'
import { deadCentres } from '@/lib/mechanics/dead-centres'
import { linkReach, pistonHeight, rodAngleAt } from '@/lib/mechanics/link-rod'
import { buildRodMotion, fillRodMotion, mastersFirst } from '@/lib/mechanics/rod-motion'
import { rodPaths } from '@/lib/mechanics/rod-path'
import { DEG, presetTrain } from './trains'

const train = presetTrain('r7-11')
const paths = rodPaths(train)
const motion = buildRodMotion(paths.length)
const fill = (theta: number) => {
  for (const i of mastersFirst(paths)) fillRodMotion(motion, paths, i, Math.cos(theta), Math.sin(theta))
}

describe('a seven-cylinder radial with link rods', () => {
  it('fillRodMotion: the knuckle keeps its place on the master rod, and the link its length', () => {
    for (let theta = 0; theta < 6.3; theta += 0.37) {
      fill(theta)
      const pin = [train.throws[0].radius * Math.cos(theta), train.throws[0].radius * Math.sin(theta)]
      const axis = [motion.pin[0] - pin[0], -pin[1]]
      for (let i = 1; i < 7; i++) {
        const { cosBank, sinBank, length } = paths[i]
        const [u, v] = [motion.bigEndU[i], motion.bigEndV[i]]
        const arm = [u * cosBank - v * sinBank - pin[0], u * sinBank + v * cosBank - pin[1]]
        expect(Math.hypot(...arm)).toBeCloseTo(0.062, 14)
        const turn = Math.atan2(arm[1], arm[0]) - Math.atan2(axis[1], axis[0])
        const { knuckleAngle } = train.cylinders[i].link!
        expect(Math.cos(turn - knuckleAngle)).toBeCloseTo(1, 13)
        expect(Math.hypot(motion.pin[i] - u, v)).toBeCloseTo(length, 14)
      }
    }
  })

  it('fillRodMotion: first and second derivatives are slopes of height and rod angle', () => {
    const h = 1e-4
    for (const theta of [0.3, 1.9, 4.4]) {
      for (let i = 0; i < 7; i++) {
        const s = (x: number) => pistonHeight(paths, i, theta + x)
        const lean = (x: number) => rodAngleAt(paths, i, theta + x)
        fill(theta)
        expect(motion.pin[i]).toBeCloseTo(s(0), 14)
        expect(motion.pin1[i]).toBeCloseTo((s(h) - s(-h)) / (2 * h), 8)
        expect(motion.pin2[i]).toBeCloseTo((s(h) - 2 * s(0) + s(-h)) / (h * h), 6)
        expect(motion.angle1[i]).toBeCloseTo((lean(h) - lean(-h)) / (2 * h), 7)
        expect(motion.angle2[i]).toBeCloseTo((lean(h) - 2 * lean(0) + lean(-h)) / (h * h), 5)
      }
    }
  })

  it('deadCentres: the links stand still there, at 52.5°, 107.0° and 156.7° (common practice)', () => {
    const centres = deadCentres(paths)
    expect(centres.slice(1, 4).map(({ top }) => Number((top / DEG).toFixed(1)))).toEqual([52.5, 107, 156.7])
    centres.forEach(({ top, bottom, topHeight, bottomHeight }, i) => {
      fill(top)
      expect(motion.pin1[i]).toBeCloseTo(0, 15)
      fill(bottom)
      expect(motion.pin1[i]).toBeCloseTo(0, 15)
      for (let theta = 0; theta < 6.3; theta += 0.01) {
        expect(pistonHeight(paths, i, theta)).toBeLessThanOrEqual(topHeight + 1e-15)
        expect(pistonHeight(paths, i, theta)).toBeGreaterThanOrEqual(bottomHeight - 1e-15)
      }
    })
  })

  it('linkReach is the greatest |sin ψ| over a turn', () => {
    for (let i = 1; i < 7; i++) {
      let greatest = 0
      for (let theta = 0; theta < 6.2832; theta += 1e-4)
        greatest = Math.max(greatest, Math.abs(Math.sin(rodAngleAt(paths, i, theta))))
      expect(linkReach(paths, i)).toBeCloseTo(greatest, 7)
    }
  })
})
