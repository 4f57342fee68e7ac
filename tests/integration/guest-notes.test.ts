import { beforeAll, describe, expect, it } from 'vitest'
import type { GuestNote } from '@/lib/contracts/guest-notes'
import type { Note, NoteCounts, NoteSummary } from '@/lib/contracts/notes'
import { call, type Answer } from './support/call'
import { sceneOf } from './support/documents'
import { newLink, newScene } from './support/links'
import { anchorOn } from './support/notes'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
let designer: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner('Tamsin Orrelby')
  designer = await newMember(server.sql, owner.workshopId, 'designer')
  await server.sql`update users set name = 'Ysolde Karrowby' where id = ${designer.id}`
  sceneId = await newScene(owner)
})

const anchor = anchorOn('single-450', 'piston:1')
const link = async (body: object = { kind: 'note' }) => (await newLink(owner, sceneId, body)).token
const write = (token: string, more: object = {}) =>
  call('POST', `/api/v1/shared/${token}/notes`, {
    body: { name: 'Delphine Astercroft', anchor, words: 'Is this the new piston?', ...more },
  })
const reply = (token: string, number: number, words: string) =>
  call('POST', `/api/v1/shared/${token}/notes/${number}/posts`, { body: { name: 'Delphine', words } })
const seen = async (token: string, query = '') => {
  const answer = await call('GET', `/api/v1/shared/${token}/notes${query}`)
  expect(answer.status).toBe(200)
  return answer.body as { notes: GuestNote[]; next: number | null }
}
const noteOf = ({ body }: Answer) => (body as { note: GuestNote }).note
const inside = (someone: Someone, method: string, path = '', body?: object) =>
  call(method, `/api/v1/scenes/${sceneId}/notes${path}`, { cookie: someone.cookie, body })
const idOf = async (id: string) => {
  const [{ number }] = await server.sql`select number from notes where id = ${id}`
  return number as number
}

describe('notes of guests', () => {
  it('POST /shared/{token}/notes makes a note with the name given, marked guest for the workshop', async () => {
    const token = await link()
    const made = await write(token, { kind: 'question', heading: 'New?' })
    expect(made.status).toBe(201)
    const number = await idOf(noteOf(made).id)
    const { note } = (await inside(owner, 'GET', `/${number}`)).body as { note: Note }
    expect(note).toMatchObject({
      kind: 'question',
      by: { id: null, name: 'Delphine Astercroft', guest: true },
      posts: [{ by: { guest: true }, words: 'Is this the new piston?' }],
      part: 'Piston 1',
    })
    expect(note.anchor).toEqual(anchor)
    const guests = (await inside(owner, 'GET', '?author=guest')).body as {
      notes: NoteSummary[]
      counts: NoteCounts
      authors: { id: string }[]
    }
    expect(guests.notes.map(({ id }) => id)).toContain(note.id)
    expect(guests.counts.all).toBe(guests.notes.length)
    expect(guests.authors).toContainEqual({ id: 'guest', name: 'Guests' })
    const audit = await server.sql`select actor_id, after from audit_log where subject = ${`note:${note.id}`}`
    expect(audit).toMatchObject([{ actor_id: null, after: { guest: 'Delphine Astercroft' } }])
  })

  it.each(['note', 'decide'])('a link of kind %s takes notes', async (kind) => {
    const token = await link({ kind })
    expect((await write(token)).status).toBe(201)
    expect((await seen(token)).notes).toHaveLength(1)
  })

  it('a link that only lets look takes none and shows none, from the moment it is changed', async () => {
    const made = await newLink(owner, sceneId, { kind: 'note' })
    expect((await write(made.token)).status).toBe(201)
    const changed = await call('PATCH', `/api/v1/share-links/${made.link.id}`, {
      cookie: owner.cookie,
      body: { kind: 'look' },
    })
    expect(changed.status).toBe(200)
    expect((await write(made.token)).status).toBe(403)
    expect((await reply(made.token, 1, 'Hello')).status).toBe(403)
    expect((await call('GET', `/api/v1/shared/${made.token}/notes`)).status).toBe(403)
  })

  it('an unknown, an ended and a withdrawn link are answered alike', async () => {
    const ended = await newLink(owner, sceneId, { kind: 'note' })
    const withdrawn = await newLink(owner, sceneId, { kind: 'note' })
    await server.sql`update share_links set ends_at = now() where id = ${ended.link.id}`
    await server.sql`update share_links set revoked_at = now() where id = ${withdrawn.link.id}`
    for (const token of [ended.token, withdrawn.token, 'A'.repeat(32)]) {
      const answers = [
        await write(token),
        await reply(token, 1, 'Hello'),
        await call('GET', `/api/v1/shared/${token}/notes`),
      ]
      for (const { status, body } of answers) {
        expect(status).toBe(404)
        expect(body).toMatchObject({ detail: 'This link is not available.' })
      }
    }
  })

  it('GET /shared/{token}/notes shows what was made through this link and no other note of the scene', async () => {
    const [one, other] = [await link(), await link()]
    await inside(owner, 'POST', '', { anchor, kind: 'error', words: 'Between ourselves' })
    await write(one, { words: 'Mine' })
    await write(other, { words: 'Somebody else’s' })
    await write(one, { words: 'Mine too', name: 'A friend' })
    const { notes } = await seen(one)
    expect(notes.map(({ number, posts }) => [number, posts[0].words])).toEqual([
      [1, 'Mine'],
      [2, 'Mine too'],
    ])
    const text = JSON.stringify(notes)
    for (const secret of ['Between ourselves', 'Somebody', 'Tamsin', owner.id])
      expect(text).not.toContain(secret)
    // the scene's own numbers would tell how many notes there are
    expect(await idOf(notes[1].id)).toBeGreaterThan(2)
  })

  it('replies are seen with the name of whoever wrote them; nobody else is named', async () => {
    const token = await link()
    const number = await idOf(noteOf(await write(token)).id)
    await inside(designer, 'POST', `/${number}/posts`, {
      words: 'Yes. @Tamsin Orrelby, do you agree? @Tamsin',
      mentions: [owner.id],
    })
    expect((await reply(token, 1, 'Thank you')).status).toBe(201)
    const [{ posts }] = (await seen(token)).notes
    expect(posts.map(({ by, guest, words }) => [by, guest, words])).toEqual([
      ['Delphine Astercroft', true, 'Is this the new piston?'],
      ['Ysolde Karrowby', false, 'Yes. @colleague, do you agree? @Tamsin'],
      ['Delphine', true, 'Thank you'],
    ])
    const text = JSON.stringify(posts)
    for (const secret of ['Orrelby', owner.id, designer.id, 'mentions', 'revision'])
      expect(text).not.toContain(secret)
    expect((await reply(token, 2, 'To a note that is not there')).status).toBe(404)
  })

  it('a deleted reply is seen as deleted, and a settled note as settled; no guest settles', async () => {
    const token = await link()
    const number = await idOf(noteOf(await write(token)).id)
    await inside(designer, 'POST', `/${number}/posts`, { words: 'Wrong thread' })
    await inside(designer, 'DELETE', `/${number}/posts/2`)
    await inside(owner, 'POST', `/${number}/settle`, { settlement: { reason: 'answered' } })
    const [note] = (await seen(token)).notes
    expect(note).toMatchObject({ state: 'settled', posts: [{}, { deleted: true, words: '' }] })
    await expect(call('POST', `/api/v1/shared/${token}/notes/1/settle`, { body: {} })).rejects.toThrow(
      'No route',
    )
    const asGuest = await call('POST', `/api/v1/scenes/${sceneId}/notes/${number}/reopen`, {
      cookie: `counterthrow_session=${token}`,
      body: {},
    })
    expect(asGuest.status).toBe(401)
    const byDesigner = await inside(designer, 'POST', `/${number}/reopen`, {})
    expect(byDesigner.status).toBe(403)
  })

  it.each([
    ['no name', { name: ' ' }, 'name'],
    ['a name that is too long', { name: 'x'.repeat(81) }, 'name'],
    ['an error, which would hold up a verdict', { kind: 'error' }, 'kind'],
    ['a part that is not there', { anchor: { ...anchor, partId: 'piston:2' } }, 'anchor.partId'],
    ['another version than the link shows', { anchor: { ...anchor, version: 2 } }, 'anchor.version'],
  ])('POST /shared/{token}/notes refuses %s', async (_, more, path) => {
    const token = await link({ kind: 'note', version: 1 })
    const answer = await write(token, more)
    expect(answer.status).toBe(422)
    expect((answer.body as { issues: { path: string }[] }).issues.map((issue) => issue.path)).toContain(path)
    expect((await seen(token)).notes).toEqual([])
  })

  it('notes made through one link at once are told apart, and its pages follow one another', async () => {
    const token = await link()
    const made = await Promise.all(
      Array.from({ length: 5 }, (_, index) => write(token, { words: `${index}` })),
    )
    expect(made.map((answer) => noteOf(answer).number).sort()).toEqual([1, 2, 3, 4, 5])
    const first = await seen(token, '?limit=3')
    const second = await seen(token, `?limit=3&after=${first.next}`)
    expect([...first.notes, ...second.notes].map(({ number }) => number)).toEqual([1, 2, 3, 4, 5])
    expect([first.next, second.next]).toEqual([3, null])
    const listed = [...first.notes, ...second.notes].map(({ id }) => id)
    for (const answer of made) expect(listed[noteOf(answer).number - 1]).toBe(noteOf(answer).id)
  })

  it('one link takes two hundred notes and no more', async () => {
    const token = await link()
    await write(token)
    await server.sql`
      insert into notes (id, scene_id, number, version, kind, heading, guest_name, link_id, anchor, part_id, part)
      select gen_random_uuid(), scene_id, 1000 + n, version, kind, heading, guest_name, link_id, anchor, part_id, part
      from notes, generate_series(2, 200) as n where id = ${(await seen(token)).notes[0].id}`
    const full = await write(token)
    expect(full).toMatchObject({ status: 422, body: { detail: 'This link takes 200 notes.' } })
    await server.sql`delete from notes where number > 1000`
  })

  it('a scene with another document is not reached through a link to this one', async () => {
    const other = await call('POST', '/api/v1/scenes', {
      cookie: owner.cookie,
      body: { document: sceneOf('v8x-5000') },
    })
    expect(other.status).toBe(201)
    const token = await link()
    expect((await write(token, { anchor: anchorOn('v8x-5000', 'piston:5') })).status).toBe(422)
  })
})
