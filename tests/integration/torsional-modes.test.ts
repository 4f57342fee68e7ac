import { describe, expect, it } from 'vitest'
import { torsionalModesSchema, type TorsionalModesAnswer } from '@/lib/contracts/torsional-modes'
import type { Issue } from '@/scene/model/issue'
import { call } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const post = (body: unknown) => call('POST', '/api/v1/torsional-modes', { body })
const issuesOf = (body: unknown) => (body as { issues: Issue[] }).issues

describe('POST /torsional-modes', () => {
  it.each(['v8x-5000', 'r7-11', 'single-125-2t'])(
    'of %s answers a stranger in the form of the contract',
    async (name) => {
      const train = preset(name)
      const { status, body } = await post({ train })
      expect(status).toBe(200)
      const answer: TorsionalModesAnswer = torsionalModesSchema.parse(body)
      expect(answer).toEqual(body)
      const { stations, inertias, stiffnesses, modes, criticals, runningRpm } = answer
      expect(stations).toHaveLength(train.throws.length + 2)
      expect([inertias.length, stiffnesses.length, modes.length]).toEqual([
        stations.length,
        stations.length - 1,
        stations.length - 1,
      ])
      expect(criticals).toHaveLength(modes.length * (train.cycle === 'four-stroke' ? 24 : 12))
      expect(runningRpm!.to).toBeCloseTo(train.operating!.maxRpm!, 9)
      for (const { order, mode, rpm, inRange, vectorSum } of criticals) {
        expect(rpm).toBeCloseTo((60 * modes[mode - 1].frequencyHz) / order, 6)
        expect(inRange).toBe(rpm >= 0.85 * runningRpm!.from && rpm <= 1.15 * runningRpm!.to)
        expect(vectorSum).toBeLessThanOrEqual(train.cylinders.length + 1e-9)
      }
    },
  )

  it('takes inertias, stiffnesses, orders and a shear modulus in place of its own', async () => {
    const { inertia: _, shape: __, ...train } = preset('single-450')
    const given = { train, inertias: [8, 6, 4], stiffnesses: [4e6, 2e6], orders: [2] }
    const { status, body } = await post(given)
    expect(status).toBe(200)
    const { modes, criticals, assumptions } = body as TorsionalModesAnswer
    // S. S. Rao, Mechanical Vibrations, Holzer’s example: √500000 and √1500000 rad/s
    expect(modes.map(({ frequencyHz }) => (2 * Math.PI * frequencyHz) ** 2)).toEqual([
      expect.closeTo(5e5, 3),
      expect.closeTo(1.5e6, 3),
    ])
    expect(criticals.map(({ order }) => order)).toEqual([2, 2])
    expect(assumptions.map(({ code }) => code)).toEqual(['lumped', 'given-inertias', 'given-stiffnesses'])

    const soft = (await post({ train: preset('i4-2000'), shearModulusGPa: 79 / 4 }))
      .body as TorsionalModesAnswer
    const steel = (await post({ train: preset('i4-2000') })).body as TorsionalModesAnswer
    expect(steel.modes[0].frequencyHz / soft.modes[0].frequencyHz).toBeCloseTo(2, 9)
  })

  it('tells no range where no operating speed is entered', async () => {
    const { operating: _, ...train } = preset('i4-2000')
    const { criticals, runningRpm } = (await post({ train })).body as TorsionalModesAnswer
    expect(runningRpm).toBeNull()
    expect(new Set(criticals.map(({ inRange }) => inRange))).toEqual(new Set([null]))
  })

  it('says every figure that is missing, where it belongs, and guesses none', async () => {
    const { inertia: _, shape: __, ...train } = preset('i4-2000')
    const { status, body } = await post({ train })
    expect(status).toBe(422)
    expect(issuesOf(body).map(({ path }) => path)).toEqual([
      'train.inertia.freeEndKgM2',
      'train.inertia.flywheelKgM2',
      'train.shape.mainDiaMm',
      'train.shape.mainLengthMm',
      'train.shape.pinDiaMm',
      'train.shape.pinLengthMm',
      'train.shape.webThicknessMm',
      'train.shape.webWidthMm',
    ])
    expect(issuesOf(body).every(({ message, fix }) => message.startsWith('Missing: the ') && fix)).toBe(true)
  })

  it('refuses lists of another length and a train that cannot turn', async () => {
    const train = preset('i4-2000')
    const paths = async (more: object) => {
      const { status, body } = await post({ train, ...more })
      return [status, ...issuesOf(body).map(({ path }) => path)]
    }
    expect(await paths({ inertias: [1, 2], stiffnesses: [1] })).toEqual([422, 'inertias', 'stiffnesses'])
    expect(await paths({ inertias: [1, 2, 3, 4, 5, 0] })).toEqual([422, 'inertias.5'])
    expect(await paths({ orders: [] })).toEqual([422, 'orders'])
    train.cylinders[1] = { ...train.cylinders[1], rodLengthMm: 10 }
    expect(await paths({})).toContain('train.cylinders.1.rodLengthMm')
  })

  it('is in the description of the interface', async () => {
    const { body } = await call('GET', '/api/v1/openapi.json')
    expect(Object.keys((body as { paths: object }).paths)).toContain('/api/v1/torsional-modes')
  })
})
