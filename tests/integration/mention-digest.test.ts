import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { write } from '@/db/client'
import { postMention } from '@/lib/services/mail/post-mention'
import { sendDigest } from '@/lib/services/mail/send-digest'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { mailsTo } from './support/mails'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
beforeAll(async () => {
  owner = await newOwner('Odo Larkspur')
})

describe('mentions', () => {
  const minute = 60_000
  let author: Someone
  let sceneId: string
  let next = 0
  beforeAll(async () => {
    author = await newMember(server.sql, owner.workshopId, 'reviewer')
    const body = { document: sceneOf('single-450') }
    const made = await call('POST', '/api/v1/scenes', { cookie: owner.cookie, body })
    sceneId = (made.body as { scene: { id: string } }).scene.id
  })

  /** A note whose first post names this person, and the mention of it. */
  async function mention(reader: Someone, words: string) {
    const [noteId, postId, number] = [randomUUID(), randomUUID(), ++next]
    await server.sql`
      insert into notes (id, scene_id, number, version, kind, heading, author_id, anchor, part_id, part)
      values (${noteId}, ${sceneId}, ${number}, 1, 'question', '', ${author.id}, '{}', 'piston:1', 'piston 1')`
    await server.sql`
      insert into note_posts (id, note_id, number, author_id, words, mentions) values (${postId}, ${noteId}, 1,
        ${author.id}, ${words}, ${server.sql.json([{ userId: reader.id, name: 'R' }])})`
    await write((tx) => postMention(tx, { userId: reader.id, sceneId, noteId, postId }))
    return { postId, number }
  }
  const reader = () => newMember(server.sql, owner.workshopId, 'designer')
  const digestJob = async ({ id }: Someone) =>
    (await server.sql`select * from graphile_worker.jobs where key = ${`digest:${id}`}`)[0]
  const passed = (minutes: number) => new Date(Date.now() + minutes * minute)

  it('many are one mail, ten minutes after the first, and the next does not put it off', async () => {
    const someone = await reader()
    const first = await mention(someone, 'Is web 4 enough?')
    const { run_at } = await digestJob(someone)
    const [{ created_at }] = await server.sql`select created_at from mentions where user_id = ${someone.id}`
    expect(run_at.getTime()).toBe(created_at.getTime() + 10 * minute)
    await mention(someone, 'And web 5?')
    expect((await digestJob(someone)).run_at).toEqual(run_at)

    await sendDigest(someone.id, passed(10))
    const [mail, ...more] = await mailsTo(server.sql, someone.email)
    expect(more).toEqual([])
    expect(mail.subject).toBe('You were named 2 times')
    expect(mail.text).toContain('> Is web 4 enough?')
    expect(mail.text).toContain('> And web 5?')
    expect(mail.text).toContain(`/scenes/${sceneId}/review?version=1&note=${first.number}`)
    await sendDigest(someone.id, passed(30))
    expect(await mailsTo(server.sql, someone.email)).toHaveLength(1)
  })

  it('the same mention twice is one', async () => {
    const someone = await reader()
    const { postId } = await mention(someone, 'Once')
    const [{ note_id: noteId }] = await server.sql`select note_id from note_posts where id = ${postId}`
    await write((tx) => postMention(tx, { userId: someone.id, sceneId, noteId, postId }))
    await sendDigest(someone.id, passed(10))
    const [mail] = await mailsTo(server.sql, someone.email)
    expect(mail.text.match(/> Once/g)).toHaveLength(1)
  })

  it('two digests at once, as after the death of a worker, are one mail', async () => {
    const someone = await reader()
    await mention(someone, 'Once only')
    await Promise.all([sendDigest(someone.id, passed(10)), sendDigest(someone.id, passed(10))])
    expect(await mailsTo(server.sql, someone.email)).toHaveLength(1)
  })

  it('one that comes right after a mail waits until ten minutes after that', async () => {
    const someone = await reader()
    await mention(someone, 'First')
    await sendDigest(someone.id)
    await server.sql`delete from graphile_worker._private_jobs`
    await mention(someone, 'Second')
    await sendDigest(someone.id)
    expect(await mailsTo(server.sql, someone.email)).toHaveLength(1)
    const [{ created_at }] = await server.sql`select created_at from mails where user_id = ${someone.id}`
    expect((await digestJob(someone)).run_at.getTime()).toBe(created_at.getTime() + 10 * minute)
    await sendDigest(someone.id, passed(10.1))
    expect(await mailsTo(server.sql, someone.email)).toHaveLength(2)
  })

  it('what was deleted, or names them no more, is left out; with nothing left there is no mail', async () => {
    const someone = await reader()
    const [kept, gone, edited] = [
      await mention(someone, 'Kept'),
      await mention(someone, 'Gone'),
      await mention(someone, 'Edited'),
    ]
    await server.sql`update note_posts set words = '', deleted_at = now() where id = ${gone.postId}`
    await server.sql`update note_posts set mentions = '[]' where id = ${edited.postId}`
    await sendDigest(someone.id, passed(10))
    const [mail] = await mailsTo(server.sql, someone.email)
    expect(mail.text.match(/^> .*$/gm)).toEqual(['> Kept'])
    expect(mail.text).toContain(`note=${kept.number}`)

    const other = await reader()
    const lost = await mention(other, 'Taken back')
    await server.sql`update note_posts set words = '', deleted_at = now() where id = ${lost.postId}`
    await sendDigest(other.id, passed(10))
    expect(await mailsTo(server.sql, other.email)).toEqual([])
  })

  it('whoever may not read it any more, or wants none, gets none', async () => {
    const [left, demoted, quiet] = [await reader(), await reader(), await reader()]
    for (const someone of [left, demoted, quiet]) await mention(someone, 'Look')
    await server.sql`delete from memberships where user_id = ${left.id}`
    await call('PUT', '/api/v1/mail-preferences', {
      cookie: quiet.cookie,
      body: { kind: 'mentions', wanted: false },
    })
    for (const someone of [left, quiet]) {
      await sendDigest(someone.id, passed(10))
      expect(await mailsTo(server.sql, someone.email)).toEqual([])
    }
    // a role that may read is told, whatever it may not do beside
    await server.sql`update memberships set role = 'sales' where user_id = ${demoted.id}`
    await sendDigest(demoted.id, passed(10))
    expect(await mailsTo(server.sql, demoted.email)).toHaveLength(1)
  })
})
