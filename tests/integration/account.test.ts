import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import type { SessionAnswer } from '@/lib/contracts/account'
import { call } from './support/call'
import { cookieOf, newOwner, password, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

const firefox = 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0'
const phone =
  'Mozilla/5.0 (iPhone; CPU iPhone OS 18_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.5 Mobile/15E148 Safari/604.1'

const signIn = (email: string, secret = password, userAgent = firefox) =>
  call('POST', '/api/v1/auth/sign-in', {
    body: { email, password: secret },
    headers: { 'user-agent': userAgent },
  })
const another = async ({ email }: Someone, userAgent = firefox) =>
  cookieOf((await signIn(email, password, userAgent)).headers)
const sessions = async (cookie: string) => {
  const { body } = await call('GET', '/api/v1/account/sessions', { cookie })
  return (body as { sessions: SessionAnswer[] }).sessions
}
const personOf = async (cookie: string) =>
  ((await call('GET', '/api/v1/auth/session', { cookie })).body as { person: unknown }).person
const changePassword = (cookie: string, present: string, next: string) =>
  call('PUT', '/api/v1/account/password', { cookie, body: { present, password: next } })

describe('sessions', () => {
  it('are listed in words, with the one that asks marked, and without token or hash', async () => {
    const owner = await newOwner()
    const cookie = await another(owner, phone)
    await another(owner)
    const { body } = await call('GET', '/api/v1/account/sessions', { cookie })
    const list = (body as { sessions: SessionAnswer[] }).sessions
    expect(list.map(({ device }) => device).sort()).toEqual([
      'A device that does not say what it is',
      'Firefox, computer with Linux',
      'Safari, phone with iOS',
    ])
    expect(list.filter(({ present }) => present)).toMatchObject([{ device: 'Safari, phone with iOS' }])
    const token = cookie.split('=')[1]
    expect(JSON.stringify(body)).not.toContain(token)
    expect(JSON.stringify(body)).not.toContain(createHash('sha256').update(token).digest('hex'))
  })

  it('one is ended by its owner alone, and it opens nothing from then on', async () => {
    const [owner, other] = [await newOwner(), await newOwner()]
    const cookie = await another(owner)
    const { id } = (await sessions(owner.cookie)).find(({ present }) => !present)!
    const end = (who: string) => call('DELETE', `/api/v1/account/sessions/${id}`, { cookie: who })
    expect((await end(other.cookie)).status).toBe(404)
    expect(await personOf(cookie)).not.toBeNull()
    expect((await end(owner.cookie)).status).toBe(204)
    expect(await personOf(cookie)).toBeNull()
    expect(await personOf(owner.cookie)).not.toBeNull()
    expect((await end(owner.cookie)).status).toBe(404)
  })

  it('signing out everywhere else leaves this one and says how many ended', async () => {
    const [owner, other] = [await newOwner(), await newOwner()]
    const cookies = [await another(owner), await another(owner, phone)]
    const answer = await call('DELETE', '/api/v1/account/sessions', { cookie: owner.cookie })
    expect(answer).toMatchObject({ status: 200, body: { ended: 2 } })
    for (const cookie of cookies) expect(await personOf(cookie)).toBeNull()
    expect(await personOf(owner.cookie)).not.toBeNull()
    expect(await personOf(other.cookie)).not.toBeNull()
  })

  it('when one was last seen is written at most once a minute', async () => {
    const owner = await newOwner()
    const seen = async () =>
      (await server.sql`select last_seen_at from sessions where user_id = ${owner.id}`)[0]
        .last_seen_at as Date
    const first = await seen()
    await personOf(owner.cookie)
    expect(await seen()).toEqual(first)
    await server.sql`update sessions set last_seen_at = now() - interval '61 seconds' where user_id = ${owner.id}`
    const old = await seen()
    await personOf(owner.cookie)
    expect((await seen()).getTime()).toBeGreaterThan(old.getTime() + 60_000)
  })
})

describe('one’s own name and password', () => {
  it('PATCH /account changes the name everywhere, trimmed', async () => {
    const owner = await newOwner('Old')
    expect(
      (await call('PATCH', '/api/v1/account', { cookie: owner.cookie, body: { name: ' New ' } })).status,
    ).toBe(204)
    expect(await personOf(owner.cookie)).toMatchObject({ name: 'New' })
    const blank = await call('PATCH', '/api/v1/account', { cookie: owner.cookie, body: { name: ' ' } })
    expect(blank.status).toBe(422)
  })

  it('PUT /account/password asks the present one and ends the other sessions, not this', async () => {
    const owner = await newOwner()
    const elsewhere = await another(owner)
    const wrong = await changePassword(owner.cookie, 'not the present one', 'another good password')
    expect(wrong.status).toBe(422)
    expect((wrong.body as { issues: { path: string }[] }).issues[0].path).toBe('present')
    expect(await personOf(elsewhere)).not.toBeNull()
    expect((await changePassword(owner.cookie, password, 'short')).status).toBe(422)

    const right = await changePassword(owner.cookie, password, 'another good password')
    expect(right).toMatchObject({ status: 200, body: { ended: 1 } })
    expect(await personOf(elsewhere)).toBeNull()
    expect(await personOf(owner.cookie)).not.toBeNull()
    expect((await signIn(owner.email)).status).toBe(401)
    expect((await signIn(owner.email, 'another good password')).status).toBe(200)
  })
})
