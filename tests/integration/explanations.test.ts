import { describe, expect, it } from 'vitest'
import { explanationSchema } from '@/lib/contracts/explanations'
import type { AnalysisAnswer } from '@/lib/contracts/analyses'
import { figureIds } from '@/lib/mechanics/explain/explain'
import { method } from '@/lib/mechanics/method'
import type { Issue } from '@/scene/model/issue'
import { call } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const v8 = preset('v8x-5000')
const train = { ...v8, shape: { ...v8.shape, deckHeightMm: 240 } }
const ask = (body: object) =>
  call('POST', '/api/v1/explanations', { body: { train, speedRpm: 6500, ...body } })

describe('POST /explanations', () => {
  it('POST /explanations answers a stranger for every figure exactly in the form of the contract', async () => {
    for (const figure of figureIds) {
      const { status, body } = await ask({ figure, angleDeg: 372 })
      expect(status, figure).toBe(200)
      expect(explanationSchema.parse(body)).toEqual(body)
    }
  })

  it('POST /explanations meets the figure of POST /analyses, and names its method', async () => {
    const analysis = (await call('POST', '/api/v1/analyses', { body: { train, speedRpm: 6500 } }))
      .body as AnalysisAnswer
    const explained = explanationSchema.parse(
      (await ask({ figure: 'side-thrust', angleDeg: 372, cylinder: '3' })).body,
    )
    const shown = analysis.loads!['3'].sideThrustN[372]
    expect(Math.abs(explained.value - shown)).toBeLessThan(1e-9 * Math.abs(shown) + 1e-9)
    expect(explained.method).toEqual(method)
    expect(explained.symbols.map(({ symbol }) => symbol)).toContain('rod angle')
  })

  it('POST /explanations refuses an unknown figure, part or speed, and a train that cannot run, each by its path', async () => {
    const paths = async (body: object) => {
      const answer = await ask(body)
      expect(answer.status).toBe(422)
      return (answer.body as { issues: Issue[] }).issues.map(({ path }) => path)
    }
    expect(await paths({ figure: 'tea' })).toEqual(['figure'])
    expect(await paths({ figure: 'rod-load', cylinder: '99' })).toEqual(['figure'])
    expect(await paths({ figure: 'torque', speedRpm: 0 })).toEqual(['speedRpm'])
    expect(await paths({ figure: 'torque', train: { ...train, firingOrder: ['1'] } })).toContain(
      'train.firingOrder',
    )
    const { shape: _gone, ...bare } = train
    const { body } = await ask({ figure: 'journal-overlap', train: bare })
    expect((body as { issues: Issue[] }).issues[0].message).toContain('not given')
  })
})
