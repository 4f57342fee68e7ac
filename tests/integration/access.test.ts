import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { access, operations, roles, type Operation, type Role } from '@/lib/auth/access'
import { allOperations } from '@/lib/contracts'
import { accountOperations } from '@/lib/contracts/account'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { call, type Asked } from './support/call'
import { sceneOf } from './support/documents'
import { anchorOn } from './support/notes'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

interface Ground {
  workshopId: string
  sceneId: string
  linkId: string
  /** Somebody else who belongs to the workshop. */
  memberId: string
  invitationId: string
  /** Somebody of the workshop who may give a verdict. */
  judgeId: string
  /** One of its outbox that has failed. */
  mailId: string
}

type Try = (ground: Ground) => { method: string; path: string; body?: unknown }

const workshop = (method: string, path = '', body?: unknown): Try => {
  return ({ workshopId }) => ({ method, path: `workshops/${workshopId}${path}`, body })
}

const link = (method: string, path = '', body?: unknown): Try => {
  return ({ linkId }) => ({ method, path: `share-links/${linkId}${path}`, body })
}

const version = (method: string, path: string, body?: unknown): Try => {
  return ({ sceneId }) => ({ method, path: `scenes/${sceneId}/versions/1/${path}`, body })
}

/** Note 1 is the owner's, 2 and 3 are the trying person's own; 3 is settled. */
const note = (method: string, path: string, body?: unknown): Try => {
  return ({ sceneId }) => ({ method, path: `scenes/${sceneId}/notes${path}`, body })
}

const document = sceneOf('single-450')
const anchor = anchorOn('single-450', 'piston:1')

/** How each operation is asked for over HTTP; one operation may be several calls. */
const tries: Record<Operation, Try[]> = {
  'scene.list': [({ workshopId }) => ({ method: 'GET', path: `scenes?workshop=${workshopId}` })],
  'scene.read': [
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/versions` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/versions/1` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/versions/1/design-sheet.pdf` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/thumbnail.png` }),
    ({ sceneId }) => ({
      method: 'POST',
      path: 'exports',
      body: { kind: 'design-sheet', sceneId, version: 1 },
    }),
    version('GET', 'approval'),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/changes?from=1&to=1` }),
  ],
  'scene.create': [
    ({ workshopId }) => ({ method: 'POST', path: 'scenes', body: { workshop: workshopId, document } }),
  ],
  'scene.save': [
    ({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/versions`, body: { base: 1, document } }),
    version('POST', 'restore', { base: 1 }),
  ],
  'scene.rename': [
    ({ sceneId }) => ({ method: 'PATCH', path: `scenes/${sceneId}`, body: { title: 'Other' } }),
  ],
  'scene.duplicate': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/duplicate`, body: {} })],
  'scene.archive': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/archive` })],
  'scene.restore': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/restore` })],
  'draft.keep': [
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/draft` }),
    ({ sceneId }) => ({ method: 'PUT', path: `scenes/${sceneId}/draft`, body: { base: 1, document } }),
    ({ sceneId }) => ({ method: 'DELETE', path: `scenes/${sceneId}/draft` }),
  ],
  'note.read': [...['', '/1', '.csv', '.json'].map((path) => note('GET', path))],
  'note.write': [
    note('POST', '', { anchor, kind: 'remark', words: 'Look.' }),
    note('POST', '/1/posts', { words: 'Seen.' }),
    note('PATCH', '/2/posts/1', { words: 'Look here.', revision: 1 }),
    note('POST', '/1/move', { anchor, revision: 1 }),
  ],
  'note.settle': [
    note('POST', '/2/settle', { settlement: { reason: 'answered' } }),
    note('POST', '/3/reopen', {}),
  ],
  'note.settle-any': [
    note('POST', '/1/settle', { settlement: { reason: 'answered' } }),
    note('PATCH', '/1', { kind: 'remark', revision: 1 }),
  ],
  'note.delete-any': [note('DELETE', '/1/posts/1')],
  'review.read': [
    version('GET', 'review'),
    version('GET', 'evidence'),
    version('POST', 'openings'),
    ({ workshopId }) => ({ method: 'GET', path: `reviews?workshop=${workshopId}` }),
  ],
  'review.ask': [
    (ground) => version('POST', 'review', { reviewers: [ground.judgeId], due: '2999-12-31' })(ground),
    version('DELETE', 'review'),
  ],
  'verdict.give': [
    version('PUT', 'checklist', { answers: [{ item: 0, answer: 'yes' }] }),
    version('POST', 'verdicts', { word: 'comment', sentence: 'Seen.' }),
  ],
  'version.withdraw': [version('POST', 'withdraw', { reason: 'Drawn wrong.' })],
  'workshop.read': [workshop('GET')],
  'workshop.change': [workshop('PATCH', '', { openingsKeptDays: 30 })],
  'workshop.leave': [workshop('DELETE', '/membership')],
  'workshop.transfer': [
    (ground) => workshop('POST', '/transfers', { to: ground.memberId, role: 'designer' })(ground),
  ],
  'person.list': [workshop('GET', '/people')],
  'person.invite': [
    workshop('GET', '/invitations'),
    workshop('POST', '/invitations', { email: 'bram@example.com', role: 'service' }),
    ({ invitationId }) => ({ method: 'POST', path: `invitations/${invitationId}/sendings` }),
    ({ invitationId }) => ({ method: 'DELETE', path: `invitations/${invitationId}` }),
  ],
  'person.change-role': [
    (ground) => workshop('PATCH', `/people/${ground.memberId}`, { role: 'sales' })(ground),
  ],
  'person.remove': [(ground) => workshop('DELETE', `/people/${ground.memberId}`)(ground)],
  'token.keep': [workshop('POST', '/tokens', { name: 'A program' })],
  'link.list': [({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/share-links` })],
  'link.create': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/share-links`, body: {} })],
  'link.change': [link('PATCH', '', { label: 'Other' })],
  'link.endless': [link('PATCH', '', { endsAt: null })],
  'link.revoke': [link('DELETE')],
  'link.openings': [
    ...['/openings', '/openings.csv', '/openings.json', '/questions'].map((path) => link('GET', path)),
  ],
  'link.erase': [link('DELETE', '/openings'), link('DELETE', '/questions')],
  'audit.read': ['', '.csv', '.json'].map((kind) => workshop('GET', `/audit-log${kind}`)),
  'mail.read': [({ workshopId }) => ({ method: 'GET', path: `mails?workshop=${workshopId}` })],
  'mail.resend': [({ mailId }) => ({ method: 'POST', path: `mails/${mailId}/resend` })],
  // for whoever holds a link: tests/integration/link-access.test.ts
  'opening.count': [],
  'question.ask': [],
}

/** The workshop as it was, whoever left it or was given another role in the case before. */
async function settle({ workshopId, id }: Pick<Someone, 'workshopId' | 'id'>, role: Role) {
  await server.sql`
    insert into memberships (workshop_id, user_id, role) values (${workshopId}, ${id}, ${role})
    on conflict (workshop_id, user_id) do update set role = ${role}`
}

async function newInvitation(owner: Someone): Promise<string> {
  await server.sql`delete from invitations where workshop_id = ${owner.workshopId}`
  const [{ id }] = await server.sql`
    insert into invitations (id, workshop_id, email, role, token_hash, invited_by, sent_at, ends_at)
    values (gen_random_uuid(), ${owner.workshopId}, 'pip@example.com', 'service',
      encode(sha256(gen_random_uuid()::text::bytea), 'hex'), ${owner.id}, now(), now() + interval '7 days')
    returning id`
  return id
}

/** A mail of the workshop that did not go. */
async function newFailedMail(workshopId: string): Promise<string> {
  const [{ id }] = await server.sql`
    insert into mails (id, key, template, to_email, to_name, workshop_id, message_id, data, state)
    select id, 'test:' || id, 'question-copy', 'pip@example.com', 'Pip', ${workshopId}, '<' || id || '@example.com>',
      '{"workshop": "W", "question": "Q"}', 'failed' from gen_random_uuid() as id returning id`
  return id
}

/** Its first version in review, as it is when there is something to answer and to call off. */
async function newReview(sceneId: string, ownerId: string) {
  await server.sql`insert into version_states (scene_id, number, state) values (${sceneId}, 1, 'in-review')`
  await server.sql`
    insert into review_requests (id, scene_id, version, asked_by, due, message, checklist)
    values (gen_random_uuid(), ${sceneId}, 1, ${ownerId}, '2999-12-31', '', '["Units"]')`
}

/** By the owner and, twice, by whoever is to try. */
async function newNotes(sceneId: string, authors: Pick<Someone, 'id'>[]) {
  for (const [index, { id }] of authors.entries()) {
    const settled = index === 2 ? { by: 'A', at: '2026-12-01T00:00:00.000Z', words: '' } : null
    const why = settled && { ...settled, settlement: { reason: 'answered' } }
    await server.sql`
      with made as (
        insert into notes (id, scene_id, number, version, kind, state, settled, heading, author_id, anchor, part_id, part)
        values (gen_random_uuid(), ${sceneId}, ${index + 1}, 1, 'question', ${why ? 'settled' : 'open'},
          ${why && server.sql.json(why)}, '', ${id}, ${server.sql.json(anchor)}, 'piston:1', 'Piston 1')
        returning id, author_id)
      insert into note_posts (id, note_id, number, author_id, words)
      select gen_random_uuid(), id, 1, author_id, 'Look' from made`
  }
}

async function newGround(owner: Someone, trying: Pick<Someone, 'id'> = owner): Promise<Ground> {
  await settle(owner, 'owner')
  await settle(spare, 'designer')
  const { cookie, workshopId } = owner
  const created = await call('POST', '/api/v1/scenes', { cookie, body: { document } })
  const { scene } = created.body as OpenedScene
  const made = await call('POST', `/api/v1/scenes/${scene.id}/share-links`, { cookie, body: {} })
  const linkId = (made.body as { link: { id: string } }).link.id
  const invitationId = await newInvitation(owner)
  const mailId = await newFailedMail(workshopId)
  await newReview(scene.id, owner.id)
  await newNotes(scene.id, [owner, trying, trying])
  return {
    workshopId,
    sceneId: scene.id,
    linkId,
    memberId: spare.id,
    invitationId,
    judgeId: owner.id,
    mailId,
  }
}

async function attempt(ground: Ground, one: Try, asked: Asked) {
  const { method, path, body } = one(ground)
  return (await call(method, `/api/v1/${path}`, { ...asked, body })).status
}

let owner: Someone
let spare: Someone
let stranger: Someone
beforeAll(async () => {
  owner = await newOwner()
  spare = await newMember(server.sql, owner.workshopId, 'designer')
  stranger = await newOwner('Owner of another workshop')
})

const cases = operations.flatMap((operation) =>
  tries[operation].map((one, index) => ({ operation, one, index })),
)

describe('who may do what', () => {
  it('the table has every role and the tests every operation', () => {
    expect(Object.keys(tries).sort()).toEqual([...operations].sort())
    expect(operations.length).toBeGreaterThan(10)
  })

  it('every call for a signed-in person is tried here, but those on what is nobody else’s', () => {
    const ids = { workshopId: '{id}', sceneId: '{id}', linkId: '{id}', invitationId: '{id}', mailId: '{id}' }
    const known = { ...ids, memberId: '{person}', judgeId: '{person}' }
    const tried = cases.map(({ one }) => {
      const { method, path } = one(known)
      const named = path
        .split('?')[0]
        .replace(/(versions|notes)\/\d/, '$1/{number}')
        .replace(/posts\/\d/, 'posts/{post}')
      return `${method} /api/v1/${named}`
    })
    const own = [
      ...['GET', 'PUT', 'DELETE'].map((method) => `${method} /api/v1/draft`),
      ...['GET', 'PUT'].map((method) => `${method} /api/v1/mail-preferences`),
      ...['', '/file'].map((path) => `GET /api/v1/exports/{id}${path}`),
      ...accountOperations.map(({ method, path }) => `${method} ${path}`),
      ...['GET /api/v1/account/tokens', 'DELETE /api/v1/account/tokens/{id}', 'POST /api/v1/workshops'],
    ]
    const all = allOperations.filter((operation) => operation.for === 'person')
    // one call may stand for two operations, by what is in its body
    expect([...new Set([...tried, ...own])].sort()).toEqual(
      all.map(({ method, path }) => `${method} ${path}`).sort(),
    )
  })

  describe.each(roles)('%s', (role) => {
    let member: Someone
    beforeAll(async () => {
      member = await newMember(server.sql, owner.workshopId, role)
    })

    beforeEach(() => settle(member, role))

    it.each(cases)('$operation ($index) as the table says', async ({ operation, one }) => {
      const status = await attempt(await newGround(owner, member), one, member)
      const allowed = (access[operation] as readonly string[]).includes(role)
      if (allowed) expect(status).toBeLessThan(300)
      else expect(status).toBe(403)
    })
  })

  it.each(cases)(
    'the owner of another workshop is told that there is nothing: $operation ($index)',
    async ({ one }) => {
      expect(await attempt(await newGround(owner), one, stranger)).toBe(404)
    },
  )

  it.each(cases)('a stranger is refused: $operation ($index)', async ({ one }) => {
    const ground = await newGround(owner)
    expect(await attempt(ground, one, {})).toBe(401)
    expect(await attempt(ground, one, { cookie: 'counterthrow_session=made-up' })).toBe(401)
  })

  it('a stranger is refused the draft of nobody', async () => {
    for (const method of ['GET', 'PUT', 'DELETE']) {
      expect(
        (await call(method, '/api/v1/draft', { body: method === 'PUT' ? { document } : undefined })).status,
      ).toBe(401)
    }
  })

  it('somebody whose membership has ended is told that there is nothing', async () => {
    const member = await newMember(server.sql, owner.workshopId, 'designer')
    await server.sql`delete from memberships where user_id = ${member.id}`
    for (const { one } of cases) expect(await attempt(await newGround(owner), one, member)).toBe(404)
  })
})
