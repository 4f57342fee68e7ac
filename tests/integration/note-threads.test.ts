import { describe, expect, it } from 'vitest'
import {
  ask,
  auditOf,
  bodyOf,
  detailOf,
  engine,
  list,
  make,
  newScene,
  noteOf,
  useCast,
} from './support/note-cast'
import { call } from './support/call'
import { anchorOn } from './support/notes'
import type { Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
const cast = useCast(server)

describe('making a note', () => {
  it('POST …/notes pins a note with its view, and GET …/notes/{number} gives all of it back', async () => {
    const sceneId = await newScene(cast.owner)
    const anchor = anchorOn(engine, 'counterweight:1F', { angleDeg: 90.1, sectionAxialMm: 12, units: 'us' })
    const made = await make(cast.reviewer, sceneId, { anchor })
    expect(made).toMatchObject({
      number: 1,
      version: 1,
      kind: 'error',
      state: 'open',
      heading: 'Moment at its limit',
      part: 'Counterweight 1F',
      by: { id: cast.reviewer.id, guest: false },
      own: true,
      maySettle: true,
      replies: 0,
      standing: 'same',
      settled: null,
      events: [],
    })
    expect(made.anchor).toEqual(anchor)
    expect(made.posts).toMatchObject([{ post: 1, own: true, editedAt: null, deletedAt: null, drawing: null }])
    const read = noteOf(await ask(cast.sales, 'GET', sceneId, '/1'))
    expect(read.anchor).toEqual(anchor)
    expect(read).toMatchObject({ own: false, maySettle: false, mayChangeKind: false })
    expect(read.posts[0]).toMatchObject({ own: false, editableUntil: null, mayDelete: false })
    expect(await auditOf(server, made)).toEqual(['note.write'])
  })

  it('POST …/notes and POST …/posts sent twice under one key make one note and one reply', async () => {
    const sceneId = await newScene(cast.owner)
    const send = (path: string, body: unknown, key: string) =>
      call('POST', `/api/v1/scenes/${sceneId}/notes${path}`, {
        ...{ cookie: cast.owner.cookie, body },
        headers: { 'idempotency-key': `${key}-${sceneId}` },
      })
    const made = await Promise.all([1, 2, 3].map(() => send('', bodyOf(), 'make')))
    expect(made.map(({ status }) => status)).toEqual([201, 201, 201])
    expect(made.map((answer) => noteOf(answer).number)).toEqual([1, 1, 1])
    const replied = await Promise.all([1, 2].map(() => send('/1/posts', { words: 'Seen.' }, 'reply')))
    expect(replied.map((answer) => noteOf(answer).posts.length)).toEqual([2, 2])
    expect((await send('/1/posts', { words: 'Other.' }, 'reply')).status).toBe(409)
    expect((await list(cast.owner, sceneId)).notes).toHaveLength(1)
  })

  it('POST …/notes numbers those made at once from 1 without a gap, also when one of them fails', async () => {
    const sceneId = await newScene(cast.owner)
    const answers = await Promise.all(
      Array.from({ length: 12 }, (_, index) =>
        ask(
          [cast.owner, cast.designer, cast.reviewer][index % 3],
          'POST',
          sceneId,
          '',
          // refused only once the number would be known
          bodyOf(index % 4 === 1 ? { mentions: [cast.stranger.id] } : {}),
        ),
      ),
    )
    expect(answers.filter(({ status }) => status === 422)).toHaveLength(3)
    const numbers = answers.filter(({ status }) => status === 201).map((answer) => noteOf(answer).number)
    expect(numbers.sort((one, other) => one - other)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9])
    expect((await list(cast.owner, sceneId)).notes.map(({ number }) => number)).toEqual([
      1, 2, 3, 4, 5, 6, 7, 8, 9,
    ])
  })

  it.each([
    ['a part that is not there', { partId: 'piston:9' }, 'anchor.partId', 'unknown-part'],
    ['a point beside its part', { pointMm: [900, 0, 0] }, 'anchor.pointMm.0', 'off-the-part'],
    ['an angle outside the cycle', { angleDeg: 720 }, 'anchor.angleDeg', 'out-of-range'],
    ['a version that is not there', { version: 7 }, 'anchor.version', 'unknown-version'],
  ])('POST …/notes refuses %s and says where', async (_, wrong, path, code) => {
    const sceneId = await newScene(cast.owner)
    const anchor = { ...anchorOn(engine, 'piston:1'), ...wrong }
    const answer = await ask(cast.owner, 'POST', sceneId, '', bodyOf({ anchor }))
    expect(answer.status).toBe(422)
    const { issues } = answer.body as { issues: { path: string; code: string; fix: string }[] }
    expect(issues).toContainEqual(expect.objectContaining({ path, code }))
    expect(issues.every(({ fix }) => fix.length > 5)).toBe(true)
    expect((await list(cast.owner, sceneId)).counts.all).toBe(0)
  })

  it('POST …/notes keeps words inert and within their stated length', async () => {
    const sceneId = await newScene(cast.owner)
    const words = '<script>alert(1)</script> [a](javascript:x) https://example.com/ ‮ =1+1'
    expect((await make(cast.owner, sceneId, { words })).posts[0].words).toBe(words)
    const long = await ask(cast.owner, 'POST', sceneId, '', bodyOf({ words: 'x'.repeat(4001) }))
    expect(long).toMatchObject({ status: 422, body: { issues: [{ path: 'words' }] } })
    const headed = await ask(cast.owner, 'POST', sceneId, '', bodyOf({ heading: 'x'.repeat(121) }))
    expect(headed).toMatchObject({ status: 422, body: { issues: [{ path: 'heading' }] } })
    expect((await ask(cast.owner, 'POST', sceneId, '', bodyOf({ words: '   ' }))).status).toBe(422)
  })

  it('POST …/notes keeps a drawing on the still as vectors, and refuses one without words', async () => {
    const sceneId = await newScene(cast.owner)
    const drawing = {
      aspect: 1.6,
      words: 'An arrow to the edge of the web',
      shapes: [
        { shape: 'arrow', from: [0.1, 0.1], to: [0.5, 0.42] },
        {
          shape: 'freehand',
          points: [
            [0.1, 0.2],
            [0.3, 0.4],
            [0.35, 0.45],
          ],
        },
      ],
    }
    const made = await make(cast.owner, sceneId, { drawing })
    expect(made.drawn).toBe(true)
    expect(made.posts[0].drawing).toEqual(drawing)
    const mute = await ask(cast.owner, 'POST', sceneId, '', bodyOf({ drawing: { ...drawing, words: '' } }))
    expect(mute).toMatchObject({ status: 422, body: { issues: [{ path: 'drawing.words' }] } })
  })
})

describe('a thread', () => {
  it('POST …/posts adds replies in order; two at once each get their own place', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.reviewer, sceneId)
    const say = (someone: Someone, words: string) => ask(someone, 'POST', sceneId, '/1/posts', { words })
    const answers = await Promise.all([
      say(cast.owner, 'one'),
      say(cast.designer, 'two'),
      say(cast.reviewer, 'three'),
    ])
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201])
    const note = noteOf(await ask(cast.owner, 'GET', sceneId, '/1'))
    expect(note.posts.map(({ post }) => post)).toEqual([1, 2, 3, 4])
    expect(
      note.posts
        .slice(1)
        .map(({ words }) => words)
        .sort(),
    ).toEqual(['one', 'three', 'two'])
    expect(note.replies).toBe(3)
    expect(note.lastPostAt).toBe(note.posts[3].at)
  })

  it('PATCH …/posts/{post} marks it as edited, within 15 minutes and by its author alone', async () => {
    const sceneId = await newScene(cast.owner)
    const made = await make(cast.designer, sceneId)
    const edit = (someone: Someone, revision: number, words = 'Better said.') =>
      ask(someone, 'PATCH', sceneId, '/1/posts/1', { revision, words })
    expect((await edit(cast.owner, 1)).status).toBe(403)
    const edited = noteOf(await edit(cast.designer, 1))
    expect(edited.posts[0]).toMatchObject({ words: 'Better said.', revision: 2 })
    expect(edited.posts[0].editedAt).not.toBeNull()
    await server.sql`update note_posts set created_at = now() - interval '14 minutes 50 seconds' where note_id = ${made.id}`
    expect((await edit(cast.designer, 2)).status).toBe(200)
    await server.sql`update note_posts set created_at = now() - interval '15 minutes' where note_id = ${made.id}`
    const late = await edit(cast.designer, 3)
    expect(late.status).toBe(403)
    expect(detailOf(late)).toContain('15 minutes')
    expect(noteOf(await ask(cast.designer, 'GET', sceneId, '/1')).posts[0]).toMatchObject({
      editableUntil: null,
      mayDelete: true,
    })
  })

  it('PATCH …/posts/{post} from two windows: the second is told what it says now, and nothing is lost', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.designer, sceneId)
    const edit = (words: string) => ask(cast.designer, 'PATCH', sceneId, '/1/posts/1', { revision: 1, words })
    const answers = await Promise.all([edit('from the left'), edit('from the right')])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    const kept = noteOf(answers.find(({ status }) => status === 200)!).posts[0].words
    const told = answers.find(({ status }) => status === 409)!.body
    expect(told).toMatchObject({
      now: { words: kept, revision: 2 },
      yours: { words: kept === 'from the left' ? 'from the right' : 'from the left' },
    })
  })

  it('DELETE …/posts/{post} leaves a tombstone without words, for its author or an owner', async () => {
    const sceneId = await newScene(cast.owner)
    const drawing = { aspect: 1, words: 'A box', shapes: [{ shape: 'box', from: [0, 0], to: [1, 1] }] }
    const made = await make(cast.reviewer, sceneId, { drawing, words: 'A secret of the trade' })
    await ask(cast.designer, 'POST', sceneId, '/1/posts', { words: 'Seen.', mentions: [cast.owner.id] })
    const remove = (someone: Someone, post: number) => ask(someone, 'DELETE', sceneId, `/1/posts/${post}`)
    expect((await remove(cast.designer, 1)).status).toBe(403)
    expect((await remove(cast.reviewer, 2)).status).toBe(403)
    expect((await remove(cast.reviewer, 1)).status).toBe(200)
    const note = noteOf(await remove(cast.owner, 2))
    expect(note.posts).toMatchObject([
      {
        post: 1,
        words: '',
        drawing: null,
        by: { id: cast.reviewer.id },
        mayDelete: false,
        editableUntil: null,
      },
      { post: 2, words: '', mentions: [], by: { id: cast.designer.id } },
    ])
    expect(note.posts.every(({ deletedAt }) => deletedAt !== null)).toBe(true)
    expect(note).toMatchObject({ words: '', drawn: false, state: 'open', replies: 1 })
    expect(
      (await ask(cast.reviewer, 'PATCH', sceneId, '/1/posts/1', { revision: 1, words: 'Back' })).status,
    ).toBe(404)
    expect((await remove(cast.reviewer, 1)).status).toBe(200)
    expect(await auditOf(server, made)).toEqual(['note.write', 'note.reply', 'note.delete', 'note.delete'])
    const [{ found }] = await server.sql`
      select count(*)::int as found from note_posts where words || coalesce(drawing::text, '') like '%secret%'`
    expect(found).toBe(0)
  })

  it('mentions are kept with the name of the time, told to whoever was named, once, and to nobody else', async () => {
    const sceneId = await newScene(cast.owner)
    const made = await make(cast.reviewer, sceneId, {
      mentions: [cast.designer.id, cast.reviewer.id, cast.designer.id],
    })
    const told = () =>
      server.sql`select user_id, note_id from mentions where scene_id = ${sceneId} order by created_at`
    expect(await told()).toMatchObject([{ user_id: cast.designer.id, note_id: made.id }])
    expect(made.posts[0].mentions).toEqual([
      { id: cast.designer.id, name: 'A designer' },
      { id: cast.reviewer.id, name: 'A reviewer' },
    ])
    const edit = (mentions: string[], revision: number) =>
      ask(cast.reviewer, 'PATCH', sceneId, '/1/posts/1', { revision, words: 'Again', mentions })
    expect((await edit([cast.designer.id, cast.sales.id], 1)).status).toBe(200)
    expect((await told()).map(({ user_id }) => user_id)).toEqual([cast.designer.id, cast.sales.id])
    const outside = await edit([cast.stranger.id], 2)
    expect(outside).toMatchObject({ status: 422, body: { issues: [{ path: 'mentions.0' }] } })
    expect(JSON.stringify(outside.body)).not.toContain('Owner of another workshop')
  })
})
