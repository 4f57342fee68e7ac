import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { beforeAll, describe, expect, it } from 'vitest'
import { seed } from '@/db/seed.mjs'
import type { SceneSummary } from '@/lib/contracts/scenes'
import { call } from './support/call'
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
    (select count(*) from seeds) as marks`

beforeAll(async () => {
  // three at once, as three processes would
  const all = await Promise.all([seed(server.url), seed(server.url), seed(server.url)])
  signIns = all[0]
}, 60_000)

describe('seed()', () => {
  it('seed() three at once, and again later, puts everything in once', async () => {
    const before = await counts()
    expect(before).toMatchObject([{ users: '6', scenes: '9', links: '3', marks: '1' }])
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
    expect(Math.max(...scenes.map(({ headVersion }) => headVersion))).toBe(3)
    expect(scenes.every(({ message }) => message !== '')).toBe(true)
    expect(await scenesOf(cookie, 'state=archived')).toHaveLength(1)
    expect(await scenesOf(await cookieFor('tamsin@thornquay.example'))).toHaveLength(4)
  })

  it('seed() leaves a live link whose address is in the post, a withdrawn and an ended one', async () => {
    const cookie = await cookieFor('fenn@larkspur.example')
    const [scene] = (await scenesOf(cookie)).filter(({ title }) => title.includes('cross plane'))
    const { body } = await call('GET', `/api/v1/scenes/${scene.id}/share-links`, { cookie })
    const states = (body as { links: { state: string }[] }).links.map(({ state }) => state)
    expect(states.sort()).toEqual(['ended', 'live', 'withdrawn'])
    const folder = join(server.dataFolder, 'mail')
    const [mail] = readdirSync(folder).map((file) => readFileSync(join(folder, file), 'utf8'))
    const [, token] = /\/s\/([\w-]+)/.exec(mail) ?? []
    expect(await call('GET', `/api/v1/shared/${token}`)).toMatchObject({ status: 200, body: { version: 3 } })
  })

  it('seed() puts nothing where other machines get in', async () => {
    process.env.COUNTERTHROW_ORIGIN = 'https://counterthrow.example'
    expect(await seed(server.url)).toEqual([])
    delete process.env.COUNTERTHROW_ORIGIN
  })
})
