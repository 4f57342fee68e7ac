import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { call, type Asked } from './support/call'
import { mailsTo, runMails } from './support/mails'
import { cookieOf, newOwner, password, type Someone } from './support/people'
import { newEmail, useServer } from './support/server'

const server = useServer()

const sessionOf = async (cookie?: string) => (await call('GET', '/api/v1/auth/session', { cookie })).body
const signIn = (email: string, secret = password, asked: Asked = {}) =>
  call('POST', '/api/v1/auth/sign-in', { body: { email, password: secret }, ...asked })
const ask = (email: string) => call('POST', '/api/v1/auth/password-resets', { body: { email } })
const redeem = (token: string, secret: string) =>
  call('POST', '/api/v1/auth/password-resets/redeem', { body: { token, password: secret } })

const resetTokenFor = async (email: string) => {
  const [mail] = await mailsTo(server.sql, email)
  return /\/reset\?token=(\S+)/.exec(mail?.text ?? '')?.[1] ?? ''
}
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex')

async function everything(): Promise<string> {
  const tables = await server.sql`select tablename from pg_tables where schemaname = 'public'`
  const rows = await Promise.all(
    tables.map(({ tablename }) => server.sql`select * from ${server.sql(tablename)}`),
  )
  return JSON.stringify(rows)
}

describe('accounts', () => {
  it('POST /auth/sign-up makes a person who owns a workshop of their own, and signs them in', async () => {
    const owner = await newOwner('Ysolde Karrowby')
    expect(await sessionOf(owner.cookie)).toMatchObject({
      person: {
        name: 'Ysolde Karrowby',
        email: owner.email,
        workshops: [{ name: 'Ysolde Karrowby’s workshop', role: 'owner' }],
      },
    })
  })

  it('POST /auth/sign-up sets a cookie that scripts and other sites do not get', async () => {
    const answer = await call('POST', '/api/v1/auth/sign-up', {
      body: { name: 'A', email: newEmail(), password },
    })
    const cookie = answer.headers.get('set-cookie')
    expect(cookie).toMatch(/HttpOnly/)
    expect(cookie).toMatch(/SameSite=Lax/)
    expect(cookie).toMatch(/Path=\//)
    expect(cookie).not.toMatch(/Secure/)
  })

  it('POST /auth/sign-up takes an address once, in whatever case, and by six at once too', async () => {
    const email = newEmail()
    const body = (text: string) => ({ body: { name: 'A', email: text, password } })
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => call('POST', '/api/v1/auth/sign-up', body(email.toUpperCase()))),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409, 409])
    expect((await call('POST', '/api/v1/auth/sign-up', body(` ${email} `))).status).toBe(409)
    const workshops = await server.sql`
      select 1 from memberships join users on users.id = user_id where email = ${email}`
    expect(workshops).toHaveLength(1)
  })

  it('POST /auth/sign-up refuses a short password and an address that is none, each by its field', async () => {
    const { status, body } = await call('POST', '/api/v1/auth/sign-up', {
      body: { name: ' ', email: 'x', password: 'short' },
    })
    expect(status).toBe(422)
    const { issues } = body as { issues: { path: string; message: string; fix: string }[] }
    expect(issues.map(({ path }) => path)).toEqual(['name', 'email', 'password'])
    for (const { message, fix } of issues) {
      expect(message).not.toMatch(/invalid/i)
      expect(fix).not.toBe('')
    }
  })

  it('POST /auth/sign-in answers an unknown address and a wrong password alike', async () => {
    const owner = await newOwner()
    const wrong = await signIn(owner.email, 'not the password')
    const unknown = await signIn(newEmail(), 'not the password')
    expect(wrong.status).toBe(401)
    expect(unknown.status).toBe(401)
    expect(unknown.body).toEqual(wrong.body)
    expect(wrong.headers.get('set-cookie')).toBeNull()
  })

  it('POST /auth/sign-in does the work of a password check for an unknown address', async () => {
    const owner = await newOwner()
    // of the processor, in all threads, and not by the clock on the wall: that also counts what others do
    const workOf = async (email: string) => {
      const before = process.cpuUsage()
      for (let round = 0; round < 8; round++) await signIn(email, 'not the password')
      const { user, system } = process.cpuUsage(before)
      return user + system
    }
    await workOf(newEmail())
    const [known, unknown] = [await workOf(owner.email), await workOf(newEmail())]
    expect(unknown).toBeGreaterThan(known / 2)
  })

  it('POST /auth/sign-out ends this session and no other', async () => {
    const owner = await newOwner()
    const other = cookieOf((await signIn(owner.email)).headers)
    const answer = await call('POST', '/api/v1/auth/sign-out', { cookie: owner.cookie })
    expect(answer.status).toBe(204)
    expect(answer.headers.get('set-cookie')).toMatch(/Max-Age=0/)
    expect(await sessionOf(owner.cookie)).toEqual({ person: null })
    expect(await sessionOf(other)).toMatchObject({ person: { id: owner.id } })
  })

  it('a session past its end opens nothing, and one past its middle is extended', async () => {
    const [old, fresh] = [await newOwner(), await newOwner()]
    const setEnd = (someone: Someone, days: number) =>
      server.sql`update sessions set expires_at = now() + ${`${days} days`}::interval where user_id = ${someone.id}`
    await setEnd(old, -1)
    await setEnd(fresh, 10)
    expect(await sessionOf(old.cookie)).toEqual({ person: null })
    expect(await sessionOf(fresh.cookie)).toMatchObject({ person: { id: fresh.id } })
    const [{ days }] = await server.sql`
      select extract(day from expires_at - now())::int as days from sessions where user_id = ${fresh.id}`
    expect(days).toBeGreaterThanOrEqual(29)
    expect(await server.sql`select 1 from sessions where user_id = ${old.id}`).toHaveLength(0)
  })
})

describe('a new password', () => {
  it('POST /auth/password-resets/redeem sets it once, ends every session, and spends the other links', async () => {
    const owner = await newOwner()
    expect((await ask(owner.email)).status).toBe(202)
    const first = await resetTokenFor(owner.email)
    await ask(owner.email)
    const second = await resetTokenFor(owner.email)
    expect(second).not.toBe(first)
    expect((await redeem(second, 'another good password')).status).toBe(204)
    expect(await sessionOf(owner.cookie)).toEqual({ person: null })
    expect((await signIn(owner.email)).status).toBe(401)
    expect((await signIn(owner.email, 'another good password')).status).toBe(200)
    expect((await redeem(second, 'a third good password')).status).toBe(404)
    expect((await redeem(first, 'a third good password')).status).toBe(404)
  })

  it('POST /auth/password-resets/redeem by five at once sets one', async () => {
    const owner = await newOwner()
    await ask(owner.email)
    const token = await resetTokenFor(owner.email)
    const answers = await Promise.all([1, 2, 3, 4, 5].map((n) => redeem(token, `good password number ${n}`)))
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 404, 404, 404, 404])
  })

  it('POST /auth/password-resets/redeem refuses a link past its end', async () => {
    const owner = await newOwner()
    await ask(owner.email)
    await server.sql`update password_reset_tokens set expires_at = now() where user_id = ${owner.id}`
    expect((await redeem(await resetTokenFor(owner.email), 'another good password')).status).toBe(404)
    expect((await signIn(owner.email)).status).toBe(200)
  })

  it('POST /auth/password-resets answers an unknown address alike and writes to nobody', async () => {
    const owner = await newOwner()
    const known = await ask(owner.email)
    const left = () =>
      server.sql`select (select count(*) from mails) as mails, (select count(*) from graphile_worker.jobs) as jobs,
        (select count(*) from password_reset_tokens) as tokens`
    const before = await left()
    const unknown = await ask(newEmail())
    expect([unknown.status, unknown.body]).toEqual([known.status, known.body])
    expect(await left()).toEqual(before)
  })

  it('GET /local/mail shows what was sent, newest first', async () => {
    const owner = await newOwner()
    await ask(owner.email)
    await runMails(server.sql)
    const { body } = await call('GET', '/api/v1/local/mail')
    expect((body as { mails: { to: string }[] }).mails[0]).toMatchObject({ to: owner.email })
  })

  it('GET /local/mail shows nothing under a name that is not this machine’s', async () => {
    const { status } = await call('GET', '/api/v1/local/mail', { headers: { host: 'elsewhere.example' } })
    expect(status).toBe(404)
  })
})

describe('what is kept of secrets', () => {
  it('the database holds no password, session token or reset token, only their hashes', async () => {
    const owner = await newOwner()
    await ask(owner.email)
    const session = owner.cookie.split('=')[1]
    const reset = await resetTokenFor(owner.email)
    const kept = await everything()
    for (const secret of [password, session, reset]) {
      expect(secret.length).toBeGreaterThan(20)
      expect(kept).not.toContain(secret)
    }
    expect(kept).toContain(sha256(session))
    expect(kept).toContain(sha256(reset))
    const [{ password_hash }] = await server.sql`select password_hash from users where id = ${owner.id}`
    expect(password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
  })
})
