import type postgres from 'postgres'
import { beforeAll, describe, expect, it } from 'vitest'
import { call } from './support/call'
import { mailAgain, mailsTo, postQuestion, runMails, type Posting } from './support/mails'
import { newMember, newOwner, type Someone } from './support/people'
import { newEmail, useServer } from './support/server'

const server = useServer()
let owner: Someone
beforeAll(async () => {
  owner = await newOwner('Odo Larkspur')
})

const again = (row: postgres.Row) => mailAgain(server.sql, row)
const post = (posting: Posting = {}) => postQuestion(server.sql, owner, posting)

describe('what somebody wants', () => {
  const preferences = async (cookie: string) => {
    const { body } = await call('GET', '/api/v1/mail-preferences', { cookie })
    const { preferences } = body as { preferences: { kind: string; wanted: boolean }[] }
    return Object.fromEntries(preferences.map(({ kind, wanted }) => [kind, wanted]))
  }
  const keep = (cookie: string, kind: string, wanted: boolean) =>
    call('PUT', '/api/v1/mail-preferences', { cookie, body: { kind, wanted } })
  const oneClick = (token: string, raw = 'List-Unsubscribe=One-Click') =>
    call('POST', `/api/v1/unsubscribe/${token}`, {
      raw,
      headers: { 'content-type': 'application/x-www-form-urlencoded' },
    })

  it('everything is wanted until it is turned off, each kind and person for themselves', async () => {
    const [one, other] = [await newOwner(), await newOwner()]
    expect(new Set(Object.values(await preferences(one.cookie)))).toEqual(new Set([true]))
    expect((await keep(one.cookie, 'questions', false)).status).toBe(200)
    expect(await preferences(one.cookie)).toMatchObject({ questions: false, mentions: true })
    expect(await preferences(other.cookie)).toMatchObject({ questions: true })
    await keep(one.cookie, 'questions', true)
    expect(await preferences(one.cookie)).toMatchObject({ questions: true })
    expect((await keep(one.cookie, 'invitation', false)).status).toBe(422)
  })

  it('a mail that was turned off after it was posted is held and says nothing any more', async () => {
    const someone = await newMember(server.sql, owner.workshopId, 'sales')
    const row = await post({ to: someone })
    await keep(someone.cookie, 'questions', false)
    await runMails(server.sql)
    expect(await again(row)).toMatchObject({
      state: 'held',
      data: null,
      unsubscribe_token: null,
      attempts: 0,
    })
  })

  it('whoever has left the workshop gets nothing more of it', async () => {
    const someone = await newMember(server.sql, owner.workshopId, 'sales')
    const row = await post({ to: someone })
    await server.sql`delete from memberships where user_id = ${someone.id}`
    await runMails(server.sql)
    expect(await again(row)).toMatchObject({ state: 'held', data: null })
  })

  it('one click in a mail program turns its kind off, without cookies; looking does not', async () => {
    const someone = await newMember(server.sql, owner.workshopId, 'sales')
    await post({ to: someone })
    const [mail] = await mailsTo(server.sql, someone.email)
    const address = /^<http:\/\/[^/]+(\/api\/v1\/unsubscribe\/([\w-]+))>$/.exec(
      mail.headers['List-Unsubscribe'],
    )
    expect(mail.headers['List-Unsubscribe-Post']).toBe('List-Unsubscribe=One-Click')
    const [, path = '', token = ''] = address ?? []

    const looked = await call('GET', path)
    expect([looked.status, looked.headers.get('location')]).toEqual([303, `/unsubscribe?token=${token}`])
    expect((await oneClick(token, 'List-Unsubscribe=Maybe')).status).toBe(400)
    expect(await preferences(someone.cookie)).toMatchObject({ questions: true })

    const answer = await oneClick(token)
    expect([answer.status, answer.body]).toEqual([200, { kind: 'questions', wanted: false }])
    expect(await preferences(someone.cookie)).toMatchObject({ questions: false, mentions: true })
    expect((await oneClick(token)).status).toBe(200)
  })

  it('a token that is not known turns off nothing and says nothing', async () => {
    const before = await server.sql`select count(*) from mail_preferences`
    expect((await oneClick('x')).status).toBe(404)
    expect((await oneClick(owner.id)).status).toBe(404)
    expect(await server.sql`select count(*) from mail_preferences`).toEqual(before)
  })

  it('mails that one cannot do without carry no such address', async () => {
    const email = newEmail()
    await post({ email })
    const [mail] = await mailsTo(server.sql, email)
    expect(mail.headers).toEqual({})
    expect(mail.text).not.toContain('unsubscribe')
  })
})
