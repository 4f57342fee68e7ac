import { beforeAll, describe, expect, it } from 'vitest'
import { problemSchema } from '@/lib/contracts/common'
import { call } from './support/call'
import { newOwner, password, type Someone } from './support/people'
import { newEmail, useServer } from './support/server'

useServer({
  RATE_LIMIT: 'on',
  COUNTERTHROW_PROXIES: '1',
  COUNTERTHROW_ORIGIN: 'https://counterthrow.example',
})
let owner: Someone
let nextAddress = 0
const from = (address: string) => ({ 'x-forwarded-for': address })
const newAddress = () => `192.0.2.${++nextAddress}`

beforeAll(async () => {
  owner = await newOwner()
})

describe('where a request comes from', () => {
  it('a write with cookies passes from our own pages alone', async () => {
    const write = (site: string) =>
      call('DELETE', '/api/v1/draft', { cookie: owner.cookie, headers: { 'sec-fetch-site': site } })
    expect((await write('same-origin')).status).toBe(204)
    for (const site of ['cross-site', 'same-site', 'none'])
      expect([site, (await write(site)).status]).toEqual([site, 403])
  })
})

describe('limits', () => {
  const signIn = (email: string, address: string) =>
    call('POST', '/api/v1/auth/sign-in', {
      body: { email, password: 'not the password' },
      headers: from(address),
    })

  it('POST /auth/sign-in is limited for one account, from whatever addresses', async () => {
    const email = newEmail()
    const statuses: number[] = []
    for (let round = 0; round < 12; round++) statuses.push((await signIn(email, newAddress())).status)
    expect(statuses).toEqual([...Array(10).fill(401), 429, 429])
  })

  it('POST /auth/sign-in is limited for one address, whatever the accounts, and says when to come back', async () => {
    const address = newAddress()
    for (let round = 0; round < 20; round++) expect((await signIn(newEmail(), address)).status).toBe(401)
    const answer = await signIn(newEmail(), address)
    expect(answer.status).toBe(429)
    expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0)
    expect(problemSchema.parse(answer.body).cure).toMatch(/^Wait \d+ seconds/)
    expect((await signIn(newEmail(), newAddress())).status).toBe(401)
  })

  it('an address that a visitor makes up in X-Forwarded-For is not believed', async () => {
    const address = newAddress()
    const statuses: number[] = []
    for (let round = 0; round < 21; round++) {
      statuses.push((await signIn(newEmail(), `203.0.113.${round}, ${address}`)).status)
    }
    expect(statuses.at(-1)).toBe(429)
  })

  it('POST /analyses is limited for an address', async () => {
    const ask = () => call('POST', '/api/v1/analyses', { body: {}, headers: from('198.51.100.9') })
    const statuses = new Set<number>()
    for (let round = 0; round < 70; round++) statuses.add((await ask()).status)
    expect([...statuses].sort()).toEqual([422, 429])
  })
})

describe('behind https', () => {
  it('the session cookie is Secure', async () => {
    const answer = await call('POST', '/api/v1/auth/sign-in', {
      body: { email: owner.email, password },
      headers: from(newAddress()),
    })
    expect(answer.headers.get('set-cookie')).toMatch(/; Secure/)
  })

  it('GET /local/mail shows nothing', async () => {
    expect((await call('GET', '/api/v1/local/mail')).status).toBe(404)
  })
})

describe('the shape of every problem', () => {
  it('a problem is application/problem+json with type, title, status, detail and cure, and is not stored', async () => {
    const answers = await Promise.all([
      call('GET', '/api/v1/scenes'),
      call('GET', '/api/v1/scenes/not-an-id', owner),
      call('GET', '/api/v1/scenes?limit=0', owner),
      call('POST', '/api/v1/scenes', { cookie: owner.cookie, raw: '{' }),
      call('POST', '/api/v1/scenes/01890000-0000-7000-8000-000000000000/duplicate', {
        cookie: owner.cookie,
        body: {},
        headers: { 'idempotency-key': 'a b' },
      }),
      call('GET', '/api/v1/shared/x'),
    ])
    expect(answers.map(({ status }) => status)).toEqual([401, 404, 422, 400, 400, 404])
    for (const { status, headers, body } of answers) {
      expect(headers.get('content-type')).toBe('application/problem+json')
      expect(headers.get('cache-control')).toBe('no-store')
      expect(problemSchema.parse(body).status).toBe(status)
    }
  })
})
