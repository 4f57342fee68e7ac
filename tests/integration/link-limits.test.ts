import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { call } from './support/call'
import { newLink, newScene } from './support/links'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer({ RATE_LIMIT: 'on' })
const password = 'counter weight 7'
let owner: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner()
  sceneId = await newScene(owner)
})
beforeEach(() => server.sql`delete from rate_buckets`)

const pass = (token: string, word: string) =>
  call('POST', `/api/v1/shared/${token}/pass`, { body: { password: word } })

describe('a link that is asked too often', () => {
  it('takes six passwords from an address, then asks for patience; another link is not held up by it', async () => {
    const { token } = await newLink(owner, sceneId, { password })
    const other = await newLink(owner, sceneId, { password })
    const tries = []
    for (let i = 0; i < 8; i++) tries.push(await pass(token, `guess number ${i}`))
    expect(tries.map(({ status }) => status)).toEqual([401, 401, 401, 401, 401, 401, 429, 429])
    expect(Number(tries[7].headers.get('retry-after'))).toBeGreaterThan(0)
    expect((await pass(token, password)).status).toBe(429)
    expect((await pass(other.token, password)).status).toBe(200)
  })

  it('the right password ends the count', async () => {
    const { token } = await newLink(owner, sceneId, { password })
    for (let round = 0; round < 3; round++) {
      for (let i = 0; i < 4; i++) expect((await pass(token, 'a wrong one')).status).toBe(401)
      expect((await pass(token, password)).status).toBe(200)
    }
  })

  it('takes three questions at once', async () => {
    const { token } = await newLink(owner, sceneId)
    const ask = (question: string) =>
      call('POST', `/api/v1/shared/${token}/questions`, {
        body: { name: 'Delphine', email: 'delphine@example.com', question, writtenForMs: 9_000 },
      })
    const answers = []
    for (const question of ['one', 'two', 'three', 'four']) answers.push((await ask(question)).status)
    expect(answers).toEqual([202, 202, 202, 429])
  })
})
