import { readdirSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { analysisSchema, type AnalysisAnswer } from '@/lib/contracts/analyses'
import { analysisParts } from '@/lib/mechanics/analysis'
import type { Issue } from '@/scene/model/issue'
import { call, type Asked } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const post = (asked: Asked) => call('POST', '/api/v1/analyses', asked)
const analysisOf = (train: unknown, more = {}) => post({ body: { train, speedRpm: 6000, ...more } })
const issuesOf = (body: unknown) => (body as { issues: Issue[] }).issues
const presets = readdirSync('scene/model/presets').map((file) => file.replace('.json', ''))

describe('POST /analyses', () => {
  it.each(presets)(
    'POST /analyses answers a stranger for %s exactly in the form of the contract',
    async (name) => {
      const train = preset(name)
      const { status, body } = await analysisOf(train, { stepDeg: 5 })
      expect(status).toBe(200)
      const answer: AnalysisAnswer = analysisSchema.parse(body)
      // nothing that the contract does not name, at any depth
      expect(answer).toEqual(body)
      const angles = (train.cycle === 'four-stroke' ? 720 : 360) / 5
      expect(answer.angleDeg).toHaveLength(angles)
      expect(answer.train.cylinderCount).toBe(train.cylinders.length)
      expect(Object.keys(answer.kinematics ?? {}).sort()).toEqual(train.cylinders.map(({ id }) => id).sort())
      for (const cylinder of Object.values(answer.kinematics ?? {}))
        expect(cylinder.velocityMS).toHaveLength(angles)
      expect(Object.keys(body as object).sort()).toEqual(['angleDeg', 'train', ...analysisParts].sort())
    },
  )

  it('POST /analyses answers only what is included', async () => {
    const { body } = await analysisOf(preset('v8x-5000'), { include: ['firing'] })
    expect(Object.keys(body as object).sort()).toEqual(['angleDeg', 'firing', 'train'])
    const { intervalsDeg, even } = (body as AnalysisAnswer).firing!
    expect(even).toBe(true)
    expect(intervalsDeg).toHaveLength(8)
    for (const interval of intervalsDeg) expect(interval).toBeCloseTo(90, 9)
  })

  it('POST /analyses refuses a rod too short to turn with the path from the root of the request', async () => {
    const train = preset('i4-2000')
    train.cylinders[1] = { ...train.cylinders[1], rodLengthMm: 10 }
    const { status, body, headers } = await analysisOf(train)
    expect(status).toBe(422)
    expect(headers.get('content-type')).toBe('application/problem+json')
    const issue = issuesOf(body).find(({ path }) => path === 'train.cylinders.1.rodLengthMm')
    expect(issue?.message).not.toBe('')
    expect(issue?.fix).not.toBe('')
  })

  it('POST /analyses names every field of a wrong request: train, speed, step and what to include', async () => {
    const fields = async (body: unknown) => {
      const answer = await post({ body })
      expect(answer.status).toBe(422)
      return issuesOf(answer.body).map(({ path }) => path)
    }
    const train = preset('i4-2000')
    expect(await fields({ train })).toEqual(['speedRpm'])
    expect(await fields({ train, speedRpm: -1, stepDeg: 0.7, include: ['tea'] })).toEqual([
      'speedRpm',
      'stepDeg',
      'include.0',
    ])
    expect(await fields({ speedRpm: 1000 })).toEqual(['train'])
    expect(
      await fields({ train: { ...train, firingOrder: ['1', '3', '3', '2'] }, speedRpm: 1000 }),
    ).toContain('train.firingOrder')
    expect(await fields([])).toEqual([''])
  })

  it('POST /analyses refuses more figures than one answer holds, with a step that would do', async () => {
    const train = preset('v12-60-6000')
    const { status, body } = await analysisOf(train, { stepDeg: 0.05 })
    expect(status).toBe(422)
    expect(issuesOf(body)).toMatchObject([{ path: 'stepDeg', fix: 'Give a step of 0.5° or more.' }])
  })

  it('POST /analyses answers 400 to what is not JSON, also where it is not UTF-8', async () => {
    const rest = {
      type: expect.any(String),
      title: expect.any(String),
      detail: expect.any(String),
      cure: expect.any(String),
    }
    for (const raw of ['{"train":', '', 'NaN', new Uint8Array([0x22, 0xff, 0x22])]) {
      expect(await post({ raw })).toMatchObject({ status: 400, body: { ...rest, status: 400 } })
    }
  })

  it('POST /analyses takes a number that is too large for none', async () => {
    const text = JSON.stringify({ train: preset('single-450'), speedRpm: 1 }).replace(
      '"speedRpm":1',
      '"speedRpm":1e999',
    )
    const { status, body } = await post({ raw: text })
    expect([status, issuesOf(body)[0].path]).toEqual([422, 'speedRpm'])
  })

  it('POST /analyses answers 413 to more than 2 MB, whether its length is told or not', async () => {
    const long = `{"train":"${'x'.repeat(2 * 1024 * 1024)}"}`
    expect((await post({ raw: long })).status).toBe(413)
    expect((await post({ raw: '{}', headers: { 'content-length': '2097153' } })).status).toBe(413)
    const just = `{"train":"${'x'.repeat(2 * 1024 * 1024 - 40)}"}`
    expect((await post({ raw: just })).status).toBe(422)
  })

  it('POST /analyses answers 415 to what is not marked as JSON', async () => {
    expect((await post({ raw: '{}', headers: { 'content-type': 'text/plain' } })).status).toBe(415)
  })
})
