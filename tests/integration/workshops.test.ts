import { beforeEach, describe, expect, it } from 'vitest'
import type { Role } from '@/lib/auth/access'
import type { PersonAnswer } from '@/lib/contracts/people'
import type { Member, WorkshopAnswer } from '@/lib/contracts/workshops'
import { call } from './support/call'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

let owner: Someone
beforeEach(async () => {
  owner = await newOwner('Odo Larkspur')
})

const at = (path = '') => `/api/v1/workshops/${owner.workshopId}${path}`
const giveRole = (actor: Someone, of: Someone, role: Role) =>
  call('PATCH', at(`/people/${of.id}`), { cookie: actor.cookie, body: { role } })
const remove = (actor: Someone, of: Someone) =>
  call('DELETE', at(`/people/${of.id}`), { cookie: actor.cookie })
const leave = (actor: Someone) => call('DELETE', at('/membership'), { cookie: actor.cookie })
const transfer = (actor: Someone, to: Someone, role: string) =>
  call('POST', at('/transfers'), { cookie: actor.cookie, body: { to: to.id, role } })
const member = (role: Role) => newMember(server.sql, owner.workshopId, role)
const personOf = async ({ cookie }: Someone) =>
  ((await call('GET', '/api/v1/auth/session', { cookie })).body as { person: PersonAnswer }).person
const owners = async () =>
  (
    await server.sql`
      select user_id from memberships where workshop_id = ${owner.workshopId} and role = 'owner'`
  ).map(({ user_id }) => user_id as string)

describe('roles', () => {
  it('are changed for the next request on, with a row before and after in the audit log', async () => {
    const other = await member('designer')
    expect((await giveRole(owner, other, 'reviewer')).status).toBe(204)
    expect((await personOf(other)).workshops).toMatchObject([{ role: 'reviewer' }])
    const rows = await server.sql`
      select before, after, actor_id from audit_log
      where subject = ${`person:${other.id}`} and operation = 'person.change-role'`
    expect(rows).toEqual([{ before: { role: 'designer' }, after: { role: 'reviewer' }, actor_id: owner.id }])
    expect((await giveRole(owner, other, 'reviewer')).status).toBe(204)
    const again = await server.sql`select 1 from audit_log where operation = 'person.change-role'
      and subject = ${`person:${other.id}`}`
    expect(again).toHaveLength(1)
  })

  it('a role that is none, and somebody who is not in, are refused', async () => {
    const stranger = await newOwner()
    expect((await giveRole(owner, stranger, 'designer')).status).toBe(404)
    expect((await giveRole(owner, owner, 'king' as Role)).status).toBe(422)
  })

  it('who was removed stays signed in and is told that there is nothing', async () => {
    const other = await member('designer')
    expect((await remove(owner, other)).status).toBe(204)
    expect(await personOf(other)).toMatchObject({ id: other.id, workshop: null, workshops: [] })
    expect((await call('GET', at(), { cookie: other.cookie })).status).toBe(404)
    const unnamed = await call('GET', '/api/v1/scenes', { cookie: other.cookie })
    expect(unnamed.status).toBe(403)
    expect((unnamed.body as { detail: string; cure: string }).cure).toContain('invite')
  })

  it('the people are listed a page at a time in the order in which they came', async () => {
    const others = [await member('sales'), await member('service'), await member('reviewer')]
    const pages: Member[][] = []
    let after: string | null = null
    do {
      const query: string = after ? `?limit=2&after=${after}` : '?limit=2'
      const { body } = await call('GET', at(`/people${query}`), { cookie: others[0].cookie })
      const page = body as { people: Member[]; next: string | null }
      pages.push(page.people)
      after = page.next
    } while (after)
    expect(pages.map((page) => page.length)).toEqual([2, 2])
    expect(pages.flat().map(({ id }) => id)).toEqual([owner, ...others].map(({ id }) => id))
    expect(pages.flat().filter(({ you }) => you)).toMatchObject([{ id: others[0].id, role: 'sales' }])
    expect((await call('GET', at('/people?after=nonsense'), { cookie: owner.cookie })).status).toBe(400)
  })
})

describe('the last owner', () => {
  it('neither leaves nor is removed nor becomes something else', async () => {
    await member('designer')
    for (const answer of [
      await leave(owner),
      await remove(owner, owner),
      await giveRole(owner, owner, 'designer'),
    ]) {
      expect(answer.status).toBe(409)
      expect(answer.body).toMatchObject({
        detail: 'The workshop would be left without an owner.',
        cure: 'Make somebody else an owner first.',
      })
    }
    expect(await owners()).toEqual([owner.id])
  })

  it('may go once there is another', async () => {
    await member('owner')
    expect((await leave(owner)).status).toBe(204)
    expect(await owners()).toHaveLength(1)
  })

  it.each(['demoting each other', 'removing each other', 'leaving', 'demoting themselves'])(
    'of two owners %s at once one stays',
    async (how) => {
      for (let round = 0; round < 4; round++) {
        owner = await newOwner()
        const other = await member('owner')
        const acts = {
          'demoting each other': () => [
            giveRole(owner, other, 'designer'),
            giveRole(other, owner, 'designer'),
          ],
          'removing each other': () => [remove(owner, other), remove(other, owner)],
          leaving: () => [leave(owner), leave(other)],
          'demoting themselves': () => [giveRole(owner, owner, 'sales'), giveRole(other, other, 'sales')],
        }[how]!
        const statuses = (await Promise.all(acts())).map(({ status }) => status)
        expect(statuses.filter((status) => status === 204)).toHaveLength(1)
        expect(await owners()).toHaveLength(1)
      }
    },
  )

  it('who has been demoted a moment before does nothing more as an owner', async () => {
    const other = await member('owner')
    const third = await member('sales')
    const [demoted, raised] = await Promise.all([
      giveRole(owner, other, 'designer'),
      giveRole(other, third, 'owner'),
    ])
    expect(demoted.status).toBe(204)
    // whichever came first, the audit log tells the same order
    const rows = await server.sql`
      select actor_id from audit_log
      where workshop_id = ${owner.workshopId} and operation = 'person.change-role' order by id`
    expect(rows.map(({ actor_id }) => actor_id)).toEqual(
      raised.status === 204 ? [other.id, owner.id] : [owner.id],
    )
  })
})

describe('handing a workshop over', () => {
  it('makes the one owner and the other what was said, together', async () => {
    const heir = await member('designer')
    expect((await transfer(owner, heir, 'reviewer')).status).toBe(204)
    expect(await owners()).toEqual([heir.id])
    expect((await personOf(owner)).workshops).toMatchObject([{ role: 'reviewer' }])
    expect((await transfer(owner, heir, 'reviewer')).status).toBe(403)
  })

  it('is refused to oneself, to a stranger and with the role of an owner, and changes nothing', async () => {
    const stranger = await newOwner()
    const heir = await member('designer')
    expect((await transfer(owner, owner, 'sales')).status).toBe(422)
    expect((await transfer(owner, stranger, 'sales')).status).toBe(404)
    expect((await transfer(owner, heir, 'owner')).status).toBe(422)
    expect(await owners()).toEqual([owner.id])
  })

  it('to two at once ends with one owner', async () => {
    const [one, other] = [await member('designer'), await member('sales')]
    const statuses = (
      await Promise.all([transfer(owner, one, 'service'), transfer(owner, other, 'service')])
    ).map(({ status }) => status)
    expect(statuses.sort()).toEqual([204, 403])
    expect(await owners()).toHaveLength(1)
  })
})

describe('the workshop before somebody', () => {
  const choose = (who: Someone, workshop: string) =>
    call('PUT', '/api/v1/account/workshop', { cookie: who.cookie, body: { workshop } })

  it('is what they chose, is kept, and is meant where none is named', async () => {
    const made = await call('POST', '/api/v1/workshops', {
      cookie: owner.cookie,
      body: { name: 'Second shop' },
    })
    expect(made.status).toBe(201)
    const { id } = made.body as { id: string }
    expect(await personOf(owner)).toMatchObject({ workshop: id })
    expect((await choose(owner, owner.workshopId)).status).toBe(204)
    const again = await call('POST', '/api/v1/auth/sign-in', {
      body: { email: owner.email, password: 'correct horse battery' },
    })
    expect((again.body as { person: PersonAnswer }).person.workshop).toBe(owner.workshopId)
    await choose(owner, id)
    const audit = await server.sql`select 1 from audit_log where workshop_id = ${id}`
    expect(audit).toHaveLength(1)
    const scenes = await call('GET', '/api/v1/scenes', { cookie: owner.cookie })
    expect(scenes).toMatchObject({ status: 200, body: { scenes: [] } })
  })

  it('is never one of which somebody is no member', async () => {
    const stranger = await newOwner()
    expect((await choose(owner, stranger.workshopId)).status).toBe(404)
    const guest = await member('sales')
    await choose(guest, owner.workshopId)
    await remove(owner, guest)
    expect(await personOf(guest)).toMatchObject({ workshop: null })
  })

  it('falls back to the oldest of the others when it is lost', async () => {
    const { id: own } = (await personOf(owner)).workshops[0]
    const second = await newOwner()
    await server.sql`insert into memberships (workshop_id, user_id, role)
      values (${second.workshopId}, ${owner.id}, 'sales')`
    await choose(owner, second.workshopId)
    expect(await personOf(owner)).toMatchObject({ workshop: second.workshopId })
    await call('DELETE', `/api/v1/workshops/${second.workshopId}/people/${owner.id}`, {
      cookie: second.cookie,
    })
    expect(await personOf(owner)).toMatchObject({ workshop: own })
  })

  it('twenty are as many as one person may have, also by five at once', async () => {
    await server.sql`
      with made as (
        insert into workshops (id, name) select gen_random_uuid(), 'W' || n from generate_series(1, 17) n
        returning id)
      insert into memberships (workshop_id, user_id, role) select id, ${owner.id}, 'owner' from made`
    const answers = await Promise.all(
      [1, 2, 3, 4, 5].map((n) =>
        call('POST', '/api/v1/workshops', { cookie: owner.cookie, body: { name: `More ${n}` } }),
      ),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 201, 409, 409, 409])
  })
})

describe('how a workshop is set', () => {
  const change = (body: object, who = owner) => call('PATCH', at(), { cookie: who.cookie, body })

  it('begins with one approver, the standard checklist and 90 days', async () => {
    const reviewer = await member('reviewer')
    const { body } = await call('GET', at(), { cookie: reviewer.cookie })
    expect(body).toMatchObject({
      needsTwoPeople: false,
      checklist: ['Phasing', 'Firing', 'Masses', 'Clearances', 'Units', 'Wording'],
      openingsKeptDays: 90,
      role: 'reviewer',
    })
    expect((body as WorkshopAnswer).may).not.toContain('workshop.change')
  })

  it('changes what is named and nothing else, and writes down that alone', async () => {
    const answer = await change({ needsTwoPeople: true, name: 'Odo Larkspur’s workshop' })
    expect(answer.body).toMatchObject({ needsTwoPeople: true, openingsKeptDays: 90 })
    await change({ checklist: ['Phasing', ' Firing '], openingsKeptDays: 30 })
    expect((await call('GET', at(), { cookie: owner.cookie })).body).toMatchObject({
      needsTwoPeople: true,
      checklist: ['Phasing', 'Firing'],
      openingsKeptDays: 30,
    })
    const rows = await server.sql`
      select before, after from audit_log
      where operation = 'workshop.change' and workshop_id = ${owner.workshopId} order by id`
    expect(rows[0]).toEqual({ before: { needsTwoPeople: false }, after: { needsTwoPeople: true } })
    expect(rows[1].after).toEqual({ checklist: ['Phasing', 'Firing'], openingsKeptDays: 30 })
  })

  it.each([
    [{ name: ' ' }, 'name'],
    [{ name: 'x'.repeat(121) }, 'name'],
    [{ openingsKeptDays: 0 }, 'openingsKeptDays'],
    [{ openingsKeptDays: 731 }, 'openingsKeptDays'],
    [{ checklist: ['Phasing', ''] }, 'checklist.1'],
    [{ checklist: Array.from({ length: 21 }, (_, n) => `Item ${n}`) }, 'checklist'],
  ])('refuses %j by its field', async (body, path) => {
    const answer = await change(body)
    expect(answer.status).toBe(422)
    expect((answer.body as { issues: { path: string }[] }).issues.map((issue) => issue.path)).toEqual([path])
  })
})
