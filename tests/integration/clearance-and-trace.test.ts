import { describe, expect, it } from 'vitest'
import { clearancesSchema, type ClearancesAnswer } from '@/lib/contracts/clearances'
import { traceSchema } from '@/lib/contracts/gas'
import { applyChanges, type Change } from '@/scene/model/path'
import type { Issue } from '@/scene/model/issue'
import { call } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const issuesOf = (body: unknown) => (body as { issues: Issue[] }).issues
const clearances = async (train: unknown) => {
  const { status, body } = await call('POST', '/api/v1/clearances', { body: { train } })
  expect(status).toBe(200)
  const answer = clearancesSchema.parse(body)
  expect(answer).toEqual(body)
  return answer
}
const tightest = ({ clearances: list }: ClearancesAnswer, kind: string) =>
  list.filter((one) => one.kind === kind).reduce((best, one) => (one.leastMm < best.leastMm ? one : best))

describe('POST /clearances', () => {
  it('answers a stranger with every pair, its parts, its least gap and angle, the tightest first', async () => {
    const answer = await clearances(preset('v2-45-1600'))
    const banks = tightest(answer, 'bank-bank')
    expect(banks).toMatchObject({ parts: ['piston:1', 'piston:2'], limitMm: 1.5, status: 'clear', mends: [] })
    expect(banks.leastMm).toBeCloseTo(3.8589, 3)
    expect(banks.angleDeg).toBeCloseTo(180, 4)
    expect(answer.notKnown).toEqual([{ name: 'Piston to deck', why: 'The deck height is not given.' }])
    const room = answer.clearances.map(({ leastMm, limitMm }) => leastMm - limitMm)
    expect(room).toEqual([...room].sort((a, b) => a - b))
  })

  it('says what touches, and each mend leads to a train that keeps the limit', async () => {
    const train = preset('v2-45-1600')
    train.cylinderDefaults = { ...train.cylinderDefaults, rodLengthMm: 191 }
    const { status, message, mends } = tightest(await clearances(train), 'bank-bank')
    expect(status).toBe('touches')
    expect(message).toBe('Piston 1 and piston 2 overlap by 1.8 mm near the crank at 180.0°.')
    expect(mends.map(({ label }) => label)).toEqual([
      'Lengthen the rod to 196.0 mm',
      'Widen the bank angle to 47.0°',
      'Shorten the skirt to 20.0 mm',
    ])
    for (const { changes } of mends) {
      const mended = await clearances(applyChanges<unknown>(train, changes as Change[]))
      expect(tightest(mended, 'bank-bank').status).toBe('clear')
    }
  })

  it('counts a deck height where the train has one', async () => {
    const train = preset('i4x-1000')
    const answer = await clearances({ ...train, shape: { ...train.shape, deckHeightMm: 140 } })
    const deck = tightest(answer, 'piston-deck')
    expect([deck.status, deck.limitMm, answer.notKnown]).toEqual(['touches', 0, []])
    expect(deck.message).toMatch(/^Piston 1 stands \d+\.\d mm above the deck at top dead centre/)
  })

  it('refuses a train that cannot run, with paths from the root of the request', async () => {
    const { status, body } = await call('POST', '/api/v1/clearances', {
      body: { train: { ...preset('i4-2000'), firingOrder: ['1', '3', '3', '2'] } },
    })
    expect([status, issuesOf(body)[0].path]).toEqual([422, 'train.firingOrder'])
  })
})

describe('POST /traces', () => {
  const csv = (row: (angle: number) => string) =>
    ['angle deg;pressure bar absolute', ...Array.from({ length: 720 }, (_, i) => row(i - 360))].join('\n')
  const post = (body: unknown) => call('POST', '/api/v1/traces', { body })

  it('answers a stranger with angles and absolute pressures that a train takes as they are', async () => {
    const { status, body } = await post({
      cycle: 'four-stroke',
      csv: csv((a) => `${a};${a === 10 ? 60 : 2}`),
    })
    expect(status).toBe(200)
    const { angleDeg, pressureBar, understood } = traceSchema.parse(body)
    expect([angleDeg[0], angleDeg.length, pressureBar[370], understood]).toEqual([-360, 720, 60, []])
    const train = { ...preset('i4-2000'), gas: { model: 'trace', angleDeg, pressureBar } }
    const run = await call('POST', '/api/v1/analyses', {
      body: { train, speedRpm: 3000, include: ['firing'] },
    })
    expect(run.status).toBe(200)
  })

  it('refuses rows by their number, and says what each should be', async () => {
    const text = csv((a) => (a === -148 ? '-152;2' : a === 5 ? '5;?' : `${a};2`))
    const { status, body } = await post({ cycle: 'four-stroke', csv: text })
    expect(status).toBe(422)
    expect(issuesOf(body)).toEqual([
      {
        path: 'csv.row[214]',
        code: 'angle-goes-back',
        message: 'Row 214: angle goes back from −149 to −152. Rows must rise from −360 to 360.',
        fix: 'Sort the rows by angle and keep one at each.',
      },
      {
        path: 'csv.row[367]',
        code: 'not-a-number',
        message: 'Row 367: “?” is not a number.',
        fix: 'Write such as 12,5 or 12.5.',
      },
    ])
  })

  it('lists fifty rows and counts the rest', async () => {
    const { body } = await post({ cycle: 'four-stroke', csv: csv((a) => `${a};x`) })
    const issues = issuesOf(body)
    expect(issues).toHaveLength(51)
    expect(issues[50]).toMatchObject({ path: 'csv', message: '670 more rows are at fault.' })
  })

  it('names every field of a wrong request', async () => {
    const { status, body } = await post({ cycle: 'six-stroke', csv: '' })
    expect([status, issuesOf(body).map(({ path }) => path)]).toEqual([422, ['cycle', 'csv']])
  })
})
