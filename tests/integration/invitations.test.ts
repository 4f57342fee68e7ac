import { createHash } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import type { Invitation } from '@/lib/contracts/invitations'
import type { PersonAnswer } from '@/lib/contracts/people'
import { call } from './support/call'
import { accept, ask, invite, look, tokenFor, withAccount } from './support/invitations'
import { cookieOf, newMember, newOwner, password, type Someone } from './support/people'
import { newEmail, useServer } from './support/server'

const server = useServer()

let owner: Someone
beforeAll(async () => {
  owner = await newOwner('Odo Larkspur')
})

const again = (id: string) => call('POST', `/api/v1/invitations/${id}/sendings`, { cookie: owner.cookie })
const withdraw = (id: string) => call('DELETE', `/api/v1/invitations/${id}`, { cookie: owner.cookie })
const listed = async () => {
  const { body } = await call('GET', `/api/v1/workshops/${owner.workshopId}/invitations`, {
    cookie: owner.cookie,
  })
  return (body as { invitations: Invitation[] }).invitations
}
const personIn = (body: unknown) => (body as { person: PersonAnswer }).person
const rolesOf = (email: string) => server.sql`
  select memberships.role from memberships join users on users.id = user_id
  where email = ${email} and memberships.workshop_id = ${owner.workshopId}`

/** Somebody with an account and a workshop of their own, invited to the other. */
async function invitedPerson(role: 'designer' | 'reviewer' = 'designer') {
  const someone = await newOwner('Bram Tollivane')
  return { someone, ...(await invite(server.sql, owner, someone.email, role)) }
}

describe('inviting', () => {
  it('puts one mail into the post, with the only copy of a token', async () => {
    const email = newEmail()
    const { invitation, token } = await invite(server.sql, owner, email, 'sales')
    expect(invitation).toMatchObject({ email, role: 'sales', state: 'open', invitedBy: 'Odo Larkspur' })
    const days = (Date.parse(invitation.endsAt) - Date.parse(invitation.sentAt)) / 86_400_000
    expect(days).toBe(7)
    const mails = await server.sql`select data from mails where to_email = ${email}`
    expect(mails).toHaveLength(1)
    expect(mails[0].data).toMatchObject({ role: 'sales', inviter: 'Odo Larkspur', endsAt: invitation.endsAt })
    const [row] = await server.sql`select * from invitations where email = ${email}`
    expect(JSON.stringify([row, await listed()])).not.toContain(token)
    expect(row.token_hash).toBe(createHash('sha256').update(token).digest('hex'))
    expect(JSON.stringify(await listed())).not.toContain(row.token_hash)
  })

  it('asks an address once at a time, in whatever case, and by six at once too', async () => {
    const email = newEmail()
    const answers = await Promise.all(Array.from({ length: 6 }, () => ask(owner, email.toUpperCase())))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409, 409])
    const refused = await ask(owner, email)
    expect(refused.status).toBe(409)
    expect((refused.body as { detail: string }).detail).toContain('is open')
    expect(await server.sql`select 1 from mails where to_email = ${email}`).toHaveLength(1)
  })

  it('says of somebody who is in already who they are there', async () => {
    const member = await newMember(server.sql, owner.workshopId, 'reviewer')
    const answer = await ask(owner, member.email)
    expect(answer.status).toBe(409)
    expect((answer.body as { detail: string }).detail).toContain('is in this workshop already, as reviewer')
  })

  it('refuses what is no address, by its field', async () => {
    const { status, body } = await ask(owner, 'bram at home')
    expect(status).toBe(422)
    expect((body as { issues: { path: string }[] }).issues[0].path).toBe('email')
  })

  it('asks anew once the first has ended, with another role, and the old link stays dead', async () => {
    const email = newEmail()
    const first = await invite(server.sql, owner, email, 'sales')
    await server.sql`update invitations set ends_at = now() where id = ${first.invitation.id}`
    const second = await invite(server.sql, owner, email, 'service')
    expect(second.invitation).toMatchObject({ id: first.invitation.id, role: 'service', state: 'open' })
    expect((await look(first.token)).status).toBe(404)
    expect((await look(second.token)).body).toMatchObject({ role: 'service' })
  })

  it('pages the list in the database, without a gap or a repetition', async () => {
    const seen: string[] = []
    let after: string | null = null
    do {
      const query: string = after ? `?limit=2&after=${after}` : '?limit=2'
      const { body } = await call('GET', `/api/v1/workshops/${owner.workshopId}/invitations${query}`, {
        cookie: owner.cookie,
      })
      const page = body as { invitations: Invitation[]; next: string | null }
      seen.push(...page.invitations.map(({ id }) => id))
      after = page.next
    } while (after)
    const all = await server.sql`select id from invitations where workshop_id = ${owner.workshopId}`
    expect(seen.length).toBeGreaterThan(2)
    expect([...seen].sort()).toEqual(all.map(({ id }) => id).sort())
  })
})

describe('accepting', () => {
  it('looking changes nothing, however often', async () => {
    const { token, someone } = await invitedPerson()
    for (let round = 0; round < 3; round++) {
      expect((await look(token)).body).toMatchObject({
        workshop: 'Odo Larkspur’s workshop',
        inviter: 'Odo Larkspur',
        email: someone.email,
        role: 'designer',
        hasAccount: true,
      })
    }
    expect(await rolesOf(someone.email)).toHaveLength(0)
  })

  it('joins with the account that has the address, once, and puts the workshop before them', async () => {
    const { token, someone, invitation } = await invitedPerson('reviewer')
    const answer = await accept(token, { cookie: someone.cookie })
    expect(answer.status).toBe(200)
    expect(answer.headers.get('set-cookie')).toBeNull()
    expect(personIn(answer.body)).toMatchObject({ workshop: owner.workshopId })
    expect(personIn(answer.body).workshops).toHaveLength(2)
    expect(await rolesOf(someone.email)).toMatchObject([{ role: 'reviewer' }])
    expect((await listed()).find(({ id }) => id === invitation.id)?.state).toBe('accepted')
    expect((await accept(token, { cookie: someone.cookie })).status).toBe(404)
    expect((await look(token)).status).toBe(404)
  })

  it('joins with a new account for the address, which has this workshop alone', async () => {
    const email = newEmail()
    const { token } = await invite(server.sql, owner, email, 'service')
    expect((await look(token)).body).toMatchObject({ hasAccount: false })
    const answer = await accept(token, withAccount('Joric Ambleforth', password))
    expect(answer.status).toBe(200)
    const session = await call('GET', '/api/v1/auth/session', { cookie: cookieOf(answer.headers) })
    expect(personIn(session.body)).toMatchObject({
      name: 'Joric Ambleforth',
      email,
      workshop: owner.workshopId,
      workshops: [{ id: owner.workshopId, role: 'service' }],
    })
  })

  it('by five at once with a new account makes one account and joins once', async () => {
    const email = newEmail()
    const { token } = await invite(server.sql, owner, email)
    const answers = await Promise.all(
      [1, 2, 3, 4, 5].map((n) => accept(token, withAccount(`Person ${n}`, password))),
    )
    const statuses = answers.map(({ status }) => status)
    expect(statuses.filter((status) => status === 200)).toHaveLength(1)
    expect(statuses.filter((status) => status === 404 || status === 409)).toHaveLength(4)
    expect(await rolesOf(email)).toHaveLength(1)
    expect(await server.sql`select 1 from users where email = ${email}`).toHaveLength(1)
  })

  it('by four at once with one account joins once', async () => {
    const { token, someone } = await invitedPerson()
    const answers = await Promise.all([1, 2, 3, 4].map(() => accept(token, { cookie: someone.cookie })))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 404, 404, 404])
  })

  it('is refused to another account, to nobody, and to a new account where there is one', async () => {
    const { token, someone } = await invitedPerson()
    const other = await newOwner('Somebody else')
    const refused = await accept(token, { cookie: other.cookie })
    expect(refused.status).toBe(403)
    expect((refused.body as { detail: string }).detail).toContain(other.email)
    expect((await accept(token)).status).toBe(401)
    expect((await accept(token, withAccount('A second', password))).status).toBe(409)
    expect((await accept(token, { cookie: someone.cookie })).status).toBe(200)
  })

  it('makes no account with a short password, and says so by the field', async () => {
    const { token } = await invite(server.sql, owner, newEmail())
    const { status, body } = await accept(token, withAccount('A', 'short'))
    expect(status).toBe(422)
    expect((body as { issues: { path: string }[] }).issues[0].path).toBe('account.password')
  })

  it('leaves the role of somebody who has come in meanwhile as it is', async () => {
    const { token, someone } = await invitedPerson('reviewer')
    await server.sql`insert into memberships (workshop_id, user_id, role)
      values (${owner.workshopId}, ${someone.id}, 'owner')`
    expect((await accept(token, { cookie: someone.cookie })).status).toBe(200)
    expect(await rolesOf(someone.email)).toMatchObject([{ role: 'owner' }])
    await server.sql`delete from memberships
      where workshop_id = ${owner.workshopId} and user_id = ${someone.id}`
  })
})

describe('what has ended', () => {
  it('unknown, used, ended, withdrawn and sent anew are answered alike, to lookers and to takers', async () => {
    const used = await invitedPerson()
    expect((await accept(used.token, { cookie: used.someone.cookie })).status).toBe(200)
    const ended = await invitedPerson()
    await server.sql`update invitations set ends_at = now() where id = ${ended.invitation.id}`
    const withdrawn = await invitedPerson()
    expect((await withdraw(withdrawn.invitation.id)).status).toBe(204)
    const old = await invitedPerson()
    expect((await again(old.invitation.id)).status).toBe(200)
    const unknown = { token: 'nobody-was-ever-given-this', someone: old.someone }

    const seen = new Set<string>()
    for (const { token, someone } of [used, ended, withdrawn, old, unknown]) {
      for (const answer of [await look(token), await accept(token, { cookie: someone.cookie })]) {
        expect(answer.status).toBe(404)
        seen.add(JSON.stringify(answer.body))
      }
      expect((await accept(token, withAccount('A new one', password))).status).toBe(404)
    }
    expect(seen.size).toBe(1)
  })

  it('sent again, the new link works for seven more days and a second mail is in the post', async () => {
    const { token, someone, invitation } = await invitedPerson()
    await server.sql`update invitations set ends_at = now() + interval '1 hour' where id = ${invitation.id}`
    const answer = await again(invitation.id)
    const renewed = (answer.body as { invitation: Invitation }).invitation
    expect(Date.parse(renewed.endsAt) - Date.now()).toBeGreaterThan(6.9 * 86_400_000)
    const fresh = await tokenFor(server.sql, someone.email)
    expect(fresh).not.toBe(token)
    expect((await accept(fresh, { cookie: someone.cookie })).status).toBe(200)
    expect(await server.sql`select 1 from mails where to_email = ${someone.email}`).toHaveLength(2)
  })

  it('withdrawn or accepted, it is neither withdrawn nor sent again', async () => {
    const withdrawn = await invitedPerson()
    await withdraw(withdrawn.invitation.id)
    const accepted = await invitedPerson()
    await accept(accepted.token, { cookie: accepted.someone.cookie })
    for (const { invitation } of [withdrawn, accepted]) {
      expect((await again(invitation.id)).status).toBe(409)
      expect((await withdraw(invitation.id)).status).toBe(409)
    }
  })

  it('of withdrawing and accepting at once one happens', async () => {
    const { token, someone, invitation } = await invitedPerson()
    const [taken, ended] = await Promise.all([
      accept(token, { cookie: someone.cookie }),
      withdraw(invitation.id),
    ])
    expect([
      [200, 409],
      [404, 204],
    ]).toContainEqual([taken.status, ended.status])
    expect(await rolesOf(someone.email)).toHaveLength(taken.status === 200 ? 1 : 0)
  })

  it('there is a row in the audit log for each step, written with it', async () => {
    const { token, someone, invitation } = await invitedPerson()
    await again(invitation.id)
    await accept(await tokenFor(server.sql, someone.email), { cookie: someone.cookie })
    expect(token).not.toBe('')
    const rows = await server.sql`
      select operation, actor_id from audit_log where subject = ${`invitation:${invitation.id}`} order by id`
    expect(rows).toMatchObject([
      { operation: 'person.invite', actor_id: owner.id },
      { operation: 'person.invite-again', actor_id: owner.id },
      { operation: 'person.join', actor_id: someone.id },
    ])
  })
})
