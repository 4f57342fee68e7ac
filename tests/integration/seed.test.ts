import { beforeAll, describe, expect, it } from 'vitest'
import { seed } from '@/db/seed.mjs'
import type { NoteSummary } from '@/lib/contracts/notes'
import type { PersonAnswer } from '@/lib/contracts/people'
import type { SceneSummary } from '@/lib/contracts/scenes'
import { call } from './support/call'
import { mailsTo } from './support/mails'
import { cookieOf } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let signIns: Awaited<ReturnType<typeof seed>>

const cookieFor = async (email: string) => {
  const { password } = signIns[0]
  const answer = await call('POST', '/api/v1/auth/sign-in', { body: { email, password } })
  expect(answer.status).toBe(200)
  return cookieOf(answer.headers)
}
const scenesOf = async (cookie: string, query = '') =>
  ((await call('GET', `/api/v1/scenes?limit=100&${query}`, { cookie })).body as { scenes: SceneSummary[] })
    .scenes
const counts = () => server.sql`
  select (select count(*) from users) as users, (select count(*) from scenes) as scenes,
    (select count(*) from scene_versions) as versions, (select count(*) from share_links) as links,
    (select count(*) from notes) as notes, (select count(*) from note_posts) as posts,
    (select count(*) from seeds) as marks`

beforeAll(async () => {
  // three at once, as three processes would
  const all = await Promise.all([seed(server.url), seed(server.url), seed(server.url)])
  signIns = all[0]
}, 60_000)

describe('seed()', () => {
  it('seed() three at once, and again later, puts everything in once', async () => {
    const before = await counts()
    expect(before).toMatchObject([
      { users: '6', scenes: '9', links: '3', notes: '4', posts: '5', marks: '1' },
    ])
    await seed(server.url)
    expect(await counts()).toEqual(before)
  })

  it('seed() that was cut short goes on where it stopped', async () => {
    const before = await counts()
    await server.sql`delete from seeds`
    await seed(server.url)
    expect(await counts()).toEqual(before)
  })

  it('seed() gives sign-ins that work, one for each role', async () => {
    expect(new Set(signIns.map(({ role }) => role))).toEqual(
      new Set(['owner', 'designer', 'sales', 'service', 'reviewer']),
    )
    for (const { email } of signIns) await cookieFor(email)
  })

  it('seed() leaves scenes with several versions and messages, one of them archived', async () => {
    const cookie = await cookieFor('ysolde@larkspur.example')
    const scenes = await scenesOf(cookie)
    expect(scenes.map(({ title }) => title)).toContain('90° V8 5.0 L, cross plane')
    expect(Math.max(...scenes.map(({ headVersion }) => headVersion))).toBe(4)
    expect(scenes.every(({ message }) => message !== '')).toBe(true)
    expect(await scenesOf(cookie, 'state=archived')).toHaveLength(1)
    expect(await scenesOf(await cookieFor('tamsin@thornquay.example'))).toHaveLength(4)
  })

  it('seed() leaves versions approved with remarks, approved, superseded and in review', async () => {
    const cookie = await cookieFor('ines@quillmarsh.example')
    const session = await call('GET', '/api/v1/auth/session', { cookie })
    const { person } = session.body as { person: PersonAnswer }
    // of two workshops the one that is named first is before her
    expect(person.workshops.find(({ id }) => id === person.workshop)?.name).toBe('Larkspur Crankworks')
    const heads = Object.fromEntries((await scenesOf(cookie)).map(({ title, state }) => [title, state]))
    expect(heads).toMatchObject({
      '90° V8 5.0 L, cross plane': 'approved-with-remarks',
      '90° V8 4.2 L, flat plane': 'in-review',
      '45° twin: which balance factor?': 'approved',
    })
    const older = await server.sql`select count(*) from version_states where state = 'superseded'`
    expect(older).toMatchObject([{ count: '5' }])
  })

  it('seed() leaves a live link whose address is in the post, a withdrawn and an ended one', async () => {
    const cookie = await cookieFor('fenn@larkspur.example')
    const [scene] = (await scenesOf(cookie)).filter(({ title }) => title.includes('cross plane'))
    const { body } = await call('GET', `/api/v1/scenes/${scene.id}/share-links`, { cookie })
    const states = (body as { links: { state: string }[] }).links.map(({ state }) => state)
    expect(states.sort()).toEqual(['ended', 'live', 'withdrawn'])
    const texts = (await mailsTo(server.sql, 'delphine@example.com')).map(({ text }) => text)
    const [, token] = /\/s\/([\w-]+)/.exec(texts.join('\n')) ?? []
    expect(await call('GET', `/api/v1/shared/${token}`)).toMatchObject({ status: 200, body: { version: 4 } })
  })

  it('seed() leaves notes: one settled as fixed in version 4, an open error, and a guest’s remark', async () => {
    const cookie = await cookieFor('ines@quillmarsh.example')
    const notesOf = async (title: string) => {
      const [{ id }] = (await scenesOf(cookie)).filter((scene) => scene.title.includes(title))
      const { body } = await call('GET', `/api/v1/scenes/${id}/notes`, { cookie })
      return (body as { notes: NoteSummary[] }).notes
    }
    expect(await notesOf('cross plane')).toMatchObject([
      { settled: { settlement: { reason: 'fixed', version: 4 } }, replies: 1, standing: 'changed' },
      { state: 'open', kind: 'remark', standing: 'same' },
      { by: { guest: true, name: 'Delphine Astercroft' }, version: 4 },
    ])
    expect(await notesOf('flat plane')).toMatchObject([{ kind: 'error', state: 'open' }])
  })

  it('seed() leaves a mail that a mail server would not take, in the owner’s outbox', async () => {
    const cookie = await cookieFor('odo@larkspur.example')
    const { body } = await call('GET', '/api/v1/mails', { cookie })
    expect((body as { mails: object[] }).mails).toContainEqual(
      expect.objectContaining({
        ...{ letter: 'link', to: 'Delphine (delphin@example.com)', state: 'failed', again: true },
        lastError: '550 5.1.1 No such mailbox here.',
      }),
    )
  })

  it('seed() puts nothing where other machines get in', async () => {
    process.env.COUNTERTHROW_ORIGIN = 'https://counterthrow.example'
    expect(await seed(server.url)).toEqual([])
    delete process.env.COUNTERTHROW_ORIGIN
  })
})
