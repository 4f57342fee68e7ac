import { sql, type SQLWrapper } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { read } from '@/db/client'
import { pageOfNotes } from '@/db/queries/notes'
import type { NoteSummary } from '@/lib/contracts/notes'
import { openErrors } from '@/lib/services/notes/open-errors'
import {
  ask,
  auditOf,
  detailOf,
  document,
  engine,
  list,
  make,
  newScene,
  noteOf,
  saveVersion,
  settle,
  useCast,
} from './support/note-cast'
import { anchorOn } from './support/notes'
import type { Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
const cast = useCast(server)

describe('settling', () => {
  it('POST …/settle is its author’s, an owner’s or a reviewer’s; nobody else’s', async () => {
    const sceneId = await newScene(cast.owner)
    for (const [author, able] of [
      [cast.designer, [cast.designer, cast.owner, cast.reviewer]],
      [cast.reviewer, [cast.reviewer, cast.owner]],
    ] as const) {
      for (const someone of [cast.owner, cast.designer, cast.second, cast.reviewer, cast.sales]) {
        const { number } = await make(author, sceneId)
        const answer = await settle(someone, sceneId, number, { reason: 'will-not-change' })
        expect(answer.status).toBe((able as readonly Someone[]).includes(someone) ? 200 : 403)
      }
    }
  })

  it('POST …/settle and …/reopen keep the whole history', async () => {
    const sceneId = await newScene(cast.owner)
    await saveVersion(cast.owner, sceneId, 1, () => ({ balanceFactor: 0.55 }))
    const made = await make(cast.reviewer, sceneId)
    const first = noteOf(
      await settle(cast.owner, sceneId, 1, { reason: 'fixed', version: 2 }, 'Radius 1 mm further out'),
    )
    expect(first).toMatchObject({
      state: 'settled',
      settled: {
        words: 'Radius 1 mm further out',
        settlement: { reason: 'fixed', version: 2 },
      },
    })
    const again = await ask(cast.reviewer, 'POST', sceneId, '/1/reopen', { words: 'Still at 97 %' })
    expect(noteOf(again)).toMatchObject({ state: 'open', settled: null })
    expect((await ask(cast.reviewer, 'POST', sceneId, '/1/reopen', {})).status).toBe(409)
    const last = noteOf(await settle(cast.reviewer, sceneId, 1, { reason: 'answered' }))
    expect(last.events.map(({ what }) => what)).toEqual([
      { event: 'settled', settlement: { reason: 'fixed', version: 2 }, words: 'Radius 1 mm further out' },
      { event: 'reopened', words: 'Still at 97 %' },
      { event: 'settled', settlement: { reason: 'answered' }, words: '' },
    ])
    expect(last.revision).toBe(4)
    expect(await auditOf(server, made)).toEqual(['note.write', 'note.settle', 'note.reopen', 'note.settle'])
  })

  it('POST …/settle by two at once: the second is told who was first and how', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.reviewer, sceneId)
    const answers = await Promise.all([
      settle(cast.owner, sceneId, 1, { reason: 'will-not-change' }),
      settle(cast.reviewer, sceneId, 1, { reason: 'answered' }),
    ])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    const first = noteOf(answers.find(({ status }) => status === 200)!)
    const refusal = answers.find(({ status }) => status === 409)!
    expect(detailOf(refusal)).toContain(first.settled!.by)
    expect(noteOf(refusal).settled).toEqual(first.settled)
    expect(first.events).toHaveLength(1)
  })

  it.each([
    ['a version that is not later', { reason: 'fixed', version: 1 }, 'settlement.version'],
    ['a version that is not there', { reason: 'fixed', version: 9 }, 'settlement.version'],
    ['itself as the duplicate', { reason: 'duplicate', number: 1 }, 'settlement.number'],
    ['a duplicate that is not there', { reason: 'duplicate', number: 9 }, 'settlement.number'],
  ])('POST …/settle refuses %s', async (_, settlement, path) => {
    const sceneId = await newScene(cast.owner)
    await make(cast.owner, sceneId)
    expect(await settle(cast.owner, sceneId, 1, settlement)).toMatchObject({
      status: 422,
      body: { issues: [{ path }] },
    })
    expect((await settle(cast.owner, sceneId, 1, { reason: 'because' })).status).toBe(422)
    expect((await list(cast.owner, sceneId)).counts).toMatchObject({ open: 1, settled: 0 })
  })

  it('PATCH …/notes/{number} changes the kind, by its author or a judge, and from its latest revision', async () => {
    const sceneId = await newScene(cast.owner)
    const made = await make(cast.designer, sceneId)
    const change = (someone: Someone, sent: object) => ask(someone, 'PATCH', sceneId, '/1', sent)
    expect((await change(cast.second, { revision: 1, kind: 'remark' })).status).toBe(403)
    expect(noteOf(await change(cast.reviewer, { revision: 1, kind: 'question' }))).toMatchObject({
      kind: 'question',
      revision: 2,
      events: [{ what: { event: 'kind-changed', from: 'error', to: 'question' } }],
    })
    const stale = await change(cast.designer, { revision: 1, kind: 'remark' })
    expect(stale.status).toBe(409)
    expect(noteOf(stale).kind).toBe('question')
    expect((await change(cast.reviewer, { revision: 2, heading: 'Mine now' })).status).toBe(403)
    expect(noteOf(await change(cast.designer, { revision: 2, heading: 'Said shorter' })).heading).toBe(
      'Said shorter',
    )
    await server.sql`update notes set created_at = now() - interval '15 minutes' where id = ${made.id}`
    expect((await change(cast.designer, { revision: 3, heading: 'Too late' })).status).toBe(403)
  })

  it('the history is append-only in the database itself', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.owner, sceneId)
    await settle(cast.owner, sceneId, 1, { reason: 'answered' })
    const tamper = [`update note_events set what = '{}'`, 'delete from note_events', 'truncate note_events']
    for (const statement of tamper) await expect(server.sql.unsafe(statement)).rejects.toThrow()
    expect(noteOf(await ask(cast.owner, 'GET', sceneId, '/1')).events).toHaveLength(1)
  })
})

describe('across versions', () => {
  const wider = (train: typeof document.train) => ({
    counterweights: train.counterweights.map((weight) =>
      weight.id === '1F' ? { ...weight, radiusMm: weight.radiusMm + 1 } : weight,
    ),
  })
  const without = (train: typeof document.train) => ({
    counterweights: train.counterweights.filter(({ id }) => id !== '1F'),
  })

  it('GET …/notes carries each note to a later version: same, changed with what changed, or gone', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.reviewer, sceneId)
    await make(cast.reviewer, sceneId, { anchor: anchorOn(engine, 'piston:1') })
    await saveVersion(cast.owner, sceneId, 1, wider)
    await saveVersion(cast.owner, sceneId, 2, without)
    const standings = async (query: string) =>
      (await list(cast.owner, sceneId, query)).notes.map(({ standing }) => standing)
    expect(await standings('?version=1')).toEqual(['same', 'same'])
    expect(await standings('?version=2')).toEqual(['changed', 'same'])
    expect(await standings('')).toEqual(['gone', 'same'])
    const [{ changes }] = (await list(cast.owner, sceneId, '?version=2')).notes
    const radius = document.train.counterweights.find(({ id }) => id === '1F')!.radiusMm
    expect(changes[0]).toEqual({
      name: 'Centre of gravity from the axis',
      from: radius.toFixed(1),
      to: (radius + 1).toFixed(1),
      unit: 'mm',
    })
    expect((await ask(cast.owner, 'GET', sceneId, '?version=4')).status).toBe(404)
  })

  it('GET …/notes of an older version leaves out what was made on a later one', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.reviewer, sceneId)
    await saveVersion(cast.owner, sceneId, 1, wider)
    await make(cast.reviewer, sceneId, { anchor: anchorOn(engine, 'rod:1', { version: 2 }) })
    const numbers = async (query: string) =>
      (await list(cast.owner, sceneId, query)).notes.map(({ number }) => number)
    expect(await numbers('?version=1')).toEqual([1])
    expect(await numbers('?version=2')).toEqual([1, 2])
    expect(await numbers('?madeOn=2')).toEqual([2])
    const open = (version: number) => read((tx) => openErrors(tx, sceneId, version))
    expect(await open(1)).toEqual([1])
    expect(await open(2)).toEqual([1, 2])
    await settle(cast.reviewer, sceneId, 1, { reason: 'answered' })
    expect(await open(2)).toEqual([2])
    await ask(cast.reviewer, 'PATCH', sceneId, '/2', { revision: 1, kind: 'question' })
    expect(await open(2)).toEqual([])
  })

  it('POST …/move pins it again and keeps where it was; from an older revision it is told', async () => {
    const sceneId = await newScene(cast.owner)
    const made = await make(cast.reviewer, sceneId)
    await saveVersion(cast.owner, sceneId, 1, without)
    const anchor = anchorOn(engine, 'counterweight:1D', { version: 2, angleDeg: 120 })
    const move = (someone: Someone, revision: number, to = anchor) =>
      ask(someone, 'POST', sceneId, '/1/move', { revision, anchor: to })
    const off = anchorOn(engine, 'counterweight:1F', { version: 2 })
    expect((await move(cast.designer, 1, off)).status).toBe(422)
    expect((await move(cast.sales, 1)).status).toBe(403)
    const answers = await Promise.all([move(cast.designer, 1), move(cast.owner, 1)])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    const note = noteOf(await ask(cast.owner, 'GET', sceneId, '/1'))
    expect(note).toMatchObject({ version: 1, part: 'Counterweight 1D', standing: 'same', revision: 2 })
    expect(note.anchor).toEqual(anchor)
    expect(note.events.map(({ what }) => what)).toEqual([{ event: 'moved', from: made.anchor, to: anchor }])
    expect((await list(cast.owner, sceneId, '?part=counterweight:1D')).counts.all).toBe(1)
    expect((await list(cast.owner, sceneId, '?part=counterweight:1F')).counts.all).toBe(0)
  })
})

describe('the list', () => {
  it('GET …/notes filters by state, kind, author and part, and counts what it lists', async () => {
    const sceneId = await newScene(cast.owner)
    const kinds = ['error', 'question', 'suggestion', 'remark'] as const
    for (const [index, kind] of [...kinds, ...kinds].entries()) {
      const partId = index % 2 ? 'piston:1' : 'rod:1'
      await make(index < 3 ? cast.designer : cast.reviewer, sceneId, {
        kind,
        anchor: anchorOn(engine, partId),
      })
    }
    await settle(cast.reviewer, sceneId, 1, { reason: 'answered' })
    await settle(cast.reviewer, sceneId, 6, { reason: 'answered' })
    const all = await list(cast.owner, sceneId)
    expect(all.counts).toEqual({
      all: 8,
      open: 6,
      settled: 2,
      openErrors: 1,
      kinds: { error: 2, question: 2, suggestion: 2, remark: 2 },
    })
    expect(all.authors.map(({ id }) => id).sort()).toEqual([cast.designer.id, cast.reviewer.id].sort())
    const filters: [string, (note: NoteSummary) => boolean][] = [
      ['state=open', ({ state }) => state === 'open'],
      ['state=settled', ({ state }) => state === 'settled'],
      ['kind=question', ({ kind }) => kind === 'question'],
      [`author=${cast.designer.id}`, ({ by }) => by.id === cast.designer.id],
      ['part=rod:1', ({ anchor }) => anchor.partId === 'rod:1'],
      ['state=open&kind=error&part=rod:1', (note) => note.state === 'open' && note.kind === 'error'],
      ['author=guest', ({ by }) => by.guest],
    ]
    for (const [query, matches] of filters) {
      const { notes, counts } = await list(cast.owner, sceneId, `?${query}`)
      const expected = all.notes.filter(matches)
      expect(
        notes.map(({ number }) => number),
        query,
      ).toEqual(expected.map(({ number }) => number))
      expect(counts.all, query).toBe(expected.length)
      expect(counts.open + counts.settled, query).toBe(expected.length)
      expect(
        Object.values(counts.kinds).reduce((sum, each) => sum + each),
        query,
      ).toBe(expected.length)
    }
    expect((await ask(cast.owner, 'GET', sceneId, '?kind=fault')).status).toBe(422)
  })

  it('GET …/notes pages by number; the counts are of all that match; a note made meanwhile shifts nothing', async () => {
    const sceneId = await newScene(cast.owner)
    for (let index = 0; index < 5; index++) await make(cast.owner, sceneId)
    const first = await list(cast.owner, sceneId, '?limit=2')
    expect(first.next).toBe(2)
    await make(cast.owner, sceneId)
    const rest = await list(cast.owner, sceneId, '?limit=2&after=2')
    const last = await list(cast.owner, sceneId, '?limit=2&after=4')
    const pages = [first, rest, last]
    expect(pages.flatMap(({ notes }) => notes.map(({ number }) => number))).toEqual([1, 2, 3, 4, 5, 6])
    expect(pages.map(({ counts }) => counts.all)).toEqual([5, 6, 6])
    expect(last.next).toBeNull()
  })

  it('two hundred notes come in one page, found by the index that numbers them', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.owner, sceneId)
    await server.sql`
      with made as (
        insert into notes (id, scene_id, number, version, kind, heading, author_id, anchor, part_id, part)
        select gen_random_uuid(), scene_id, n, version, kind, heading, author_id, anchor, part_id, part
        from notes, generate_series(2, 200) as n where scene_id = ${sceneId} returning id, author_id)
      insert into note_posts (id, note_id, number, author_id, words)
      select gen_random_uuid(), id, 1, author_id, 'words' from made`
    await saveVersion(cast.owner, sceneId, 1, () => ({ balanceFactor: 0.4 }))
    const { notes, counts, next } = await list(cast.owner, sceneId, '?limit=200')
    expect(notes.map(({ number }) => number)).toEqual(Array.from({ length: 200 }, (_, index) => index + 1))
    expect(counts).toMatchObject({ all: 200, openErrors: 200 })
    expect(next).toBeNull()
    const [page, counted] = await read(async (tx) => {
      await tx.execute(sql`set local enable_seqscan = off`)
      const plan = async (query: SQLWrapper) => JSON.stringify(await tx.execute(sql`explain ${query}`))
      return [
        await plan(pageOfNotes(tx, sceneId, 2, {}, { after: 100, limit: 50 })),
        await plan(
          sql`select * from notes where scene_id = ${sceneId} and kind = 'error' and state = 'open'`,
        ),
      ]
    })
    expect(page).toMatch(/Index Cond: \(\(scene_id = [^)]+\) AND \(number > /)
    expect(page).not.toContain('Sort')
    expect(counted).toMatch(/notes_number|notes_open_errors/)
  })
})

describe('a stranger is refused', () => {
  it('whoever belongs to another workshop, or to none, learns nothing of a note', async () => {
    const sceneId = await newScene(cast.owner)
    await make(cast.owner, sceneId, { words: 'Not for everybody' })
    const calls = [
      ['GET', ''],
      ['GET', '/1'],
      ['POST', '/1/posts', { words: 'Hello' }],
      ['POST', '/1/settle', { settlement: { reason: 'answered' } }],
      ['POST', '/1/reopen', {}],
      ['DELETE', '/1/posts/1'],
      ['GET', '.csv'],
      ['GET', '.json'],
    ] as const
    for (const [method, path, sent] of calls) {
      const theirs = await ask(cast.stranger, method, sceneId, path, sent)
      expect(theirs.status, path).toBe(404)
      expect(JSON.stringify(theirs.body)).not.toContain('Not for everybody')
      expect((await ask({}, method, sceneId, path, sent)).status, path).toBe(401)
    }
    expect((await ask(cast.sales, 'POST', sceneId, '/1/posts', { words: 'Hello' })).status).toBe(403)
    expect((await ask(cast.owner, 'GET', sceneId, '/2')).status).toBe(404)
  })
})
