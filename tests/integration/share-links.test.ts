import { createHash } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import type { OpenedScene } from '@/lib/contracts/scenes'
import type { ShareLink } from '@/lib/contracts/share-links'
import { sharedSceneSchema } from '@/lib/contracts/shared'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
let sceneId: string

const save = (base: number, angleDeg: number) =>
  call('POST', `/api/v1/scenes/${sceneId}/versions`, {
    cookie: owner.cookie,
    body: { base, document: sceneOf('v8x-5000', { angleDeg }) },
  })

async function newLink(body: object = {}) {
  const answer = await call('POST', `/api/v1/scenes/${sceneId}/share-links`, { cookie: owner.cookie, body })
  expect(answer.status).toBe(201)
  const { link, url } = answer.body as { link: ShareLink; url: string }
  return { link, url, token: url.split('/s/')[1] }
}

const open = (token: string) => call('GET', `/api/v1/shared/${token}`)
const browser = { 'user-agent': 'A browser on a desk' }
const count = (token: string) => call('POST', `/api/v1/shared/${token}/openings`, { headers: browser })
const links = async () =>
  ((await call('GET', `/api/v1/scenes/${sceneId}/share-links`, owner)).body as { links: ShareLink[] }).links
const withdraw = (id: string) => call('DELETE', `/api/v1/share-links/${id}`, owner)
const inAWhile = () => new Date(Date.now() + 3_600_000).toISOString()

beforeAll(async () => {
  owner = await newOwner()
  const created = await call('POST', '/api/v1/scenes', {
    cookie: owner.cookie,
    body: { title: 'For Delphine', document: sceneOf('v8x-5000', { angleDeg: 11 }) },
  })
  sceneId = (created.body as OpenedScene).scene.id
  await save(1, 22)
})

describe('share links', () => {
  it('GET /shared/{token} opens the latest version, or the pinned one, for a stranger, with its view', async () => {
    const latest = await newLink()
    const pinned = await newLink({ version: 1 })
    await save(2, 33)
    const angle = async (token: string) => {
      const answer = await open(token)
      expect(answer.status).toBe(200)
      expect(answer.headers.get('cache-control')).toBe('no-store')
      const shared = sharedSceneSchema.parse(answer.body)
      return [shared.version, shared.document.view.angleDeg]
    }
    expect(await angle(latest.token)).toEqual([3, 33])
    expect(await angle(pinned.token)).toEqual([1, 11])
  })

  it('GET /shared/{token} tells a stranger nothing but what the link is for', async () => {
    const { token } = await newLink()
    const { body } = await open(token)
    expect(Object.keys(body as object).sort()).toEqual([
      'approved',
      'document',
      'endsAt',
      'framable',
      'kind',
      'locked',
      'openingsKeptDays',
      'savedAt',
      'title',
      'version',
      'versions',
      'workshop',
    ])
  })

  it('POST /shared/{token}/openings counts each opening; reading, as mail scanners do, counts none', async () => {
    const { link, token } = await newLink()
    await Promise.all([1, 2].map(() => open(token)))
    const untouched = (await links()).find(({ id }) => id === link.id)
    expect(untouched).toMatchObject({ opened: 0, lastOpenedAt: null })
    const answers = await Promise.all([1, 2, 3, 4].map(() => count(token)))
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200])
    const counted = (await links()).find(({ id }) => id === link.id)
    expect(counted).toMatchObject({ opened: 4, state: 'live' })
    expect(counted?.lastOpenedAt).not.toBeNull()
  })

  it('an unknown, an ended and a withdrawn link are answered with the same words and headers', async () => {
    const ended = await newLink({ endsAt: inAWhile() })
    const withdrawn = await newLink()
    expect((await open(ended.token)).status).toBe(200)
    await server.sql`update share_links set ends_at = now() where id = ${ended.link.id}`
    expect((await withdraw(withdrawn.link.id)).body).toMatchObject({ link: { state: 'withdrawn' } })
    const tokens = [ended.token, withdrawn.token, 'A'.repeat(32), 'x', 'y'.repeat(500), '%00']
    for (const ask of [open, count]) {
      const answers = await Promise.all(tokens.map(ask))
      for (const { status, body, headers } of answers) {
        expect(status).toBe(404)
        expect(body).toEqual(answers[0].body)
        expect([...headers]).toEqual([...answers[0].headers])
      }
    }
    expect((await links()).find(({ id }) => id === ended.link.id)).toMatchObject({
      state: 'ended',
      opened: 0,
    })
  })

  it('DELETE /share-links/{id} withdraws for good; twice changes nothing more', async () => {
    const { link } = await newLink()
    const first = (await withdraw(link.id)).body as { link: ShareLink }
    const second = (await withdraw(link.id)).body as { link: ShareLink }
    expect(second.link.revokedAt).toBe(first.link.revokedAt)
    const rows =
      await server.sql`select operation from audit_log where subject = ${`link:${link.id}`} order by id`
    expect(rows.map(({ operation }) => operation)).toEqual(['link.create', 'link.revoke'])
  })

  it('POST /scenes/{id}/share-links tells the address once; the database holds only a hash of its token', async () => {
    const { token, url } = await newLink({ label: 'For Delphine' })
    expect(url).toMatch(/^http:\/\/127\.0\.0\.1:3000\/s\/[A-Za-z0-9_-]{32}$/)
    const [{ token_hash }] = await server.sql`select token_hash from share_links where label = 'For Delphine'`
    expect(token_hash).toBe(createHash('sha256').update(token).digest('hex'))
    const kept = await server.sql`select * from share_links, audit_log`
    expect(JSON.stringify(kept)).not.toContain(token)
    expect(JSON.stringify(await links())).not.toContain(token)
  })

  it('POST /scenes/{id}/share-links refuses an end that has passed and a version that is not there', async () => {
    const make = (body: object) =>
      call('POST', `/api/v1/scenes/${sceneId}/share-links`, { cookie: owner.cookie, body })
    expect(await make({ endsAt: '2020-01-01T00:00:00.000Z' })).toMatchObject({
      status: 422,
      body: { issues: [{ path: 'endsAt' }] },
    })
    expect((await make({ version: 99 })).status).toBe(404)
  })

  it('a link opens its own scene alone: its token is no session', async () => {
    const { token } = await newLink()
    const cookie = `counterthrow_session=${token}`
    expect((await call('GET', `/api/v1/scenes/${sceneId}`, { cookie })).status).toBe(401)
  })
})
