import { beforeAll, describe, expect, it } from 'vitest'
import { newLinkPass, passSeconds } from '@/lib/auth/link-pass'
import { allOperations } from '@/lib/contracts'
import { originOf } from '@/lib/contracts/link-options'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { askBehind, behindLinks, newLink, newScene } from './support/links'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
const password = 'counter weight 7'
let owner: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner()
  sceneId = await newScene(owner)
})

const change = (id: string, body: object, who = owner) =>
  call('PATCH', `/api/v1/share-links/${id}`, { cookie: who.cookie, body })
const open = (token: string, headers: Record<string, string> = {}) =>
  askBehind(token, behindLinks[0], headers)
const pass = (token: string, word: string) =>
  call('POST', `/api/v1/shared/${token}/pass`, { body: { password: word } })
const passed = async (token: string) => ((await pass(token, password)).body as { pass: string }).pass

describe('everything behind a link', () => {
  it('is listed: each operation of the interface below /shared/{token}, but giving the password', () => {
    const below = allOperations
      .map(({ method, path }) => `${method} ${path}`)
      .filter((one) => one.includes('/shared/{token}') && !one.endsWith('/pass'))
    const listed = behindLinks.map(
      ({ method, path }) =>
        `${method} /api/v1/shared/{token}${path.replace(/[0-9a-f-]{36}/, '{opening}').replace('notes/1', 'notes/{number}')}`,
    )
    expect(listed.sort()).toEqual(below.sort())
  })

  it('wants the password alike where there is one, and says nothing of the scene', async () => {
    const { token } = await newLink(owner, sceneId, { password, kind: 'decide' })
    const proof = await passed(token)
    for (const one of behindLinks) {
      const without = await askBehind(token, one)
      expect(without).toMatchObject({ status: 401, body: { type: '/problems/password-wanted' } })
      expect(JSON.stringify(without.body)).not.toContain('Delphine')
      expect((await askBehind(token, one, { 'x-link-pass': 'made.up' })).body).toEqual(without.body)
      expect((await askBehind(token, one, { 'x-link-pass': proof })).status).toBeLessThan(300)
    }
  })

  it('is gone alike for an unknown, an ended and a withdrawn link, with a password or without', async () => {
    const ended = await newLink(owner, sceneId, {
      password,
      endsAt: new Date(Date.now() + 60_000).toISOString(),
    })
    const proof = await passed(ended.token)
    await server.sql`update share_links set ends_at = now() where id = ${ended.link.id}`
    const withdrawn = await newLink(owner, sceneId, { kind: 'decide' })
    await call('DELETE', `/api/v1/share-links/${withdrawn.link.id}`, owner)
    for (const one of [...behindLinks, { method: 'POST', path: '/pass', body: { password } }]) {
      const answers = await Promise.all(
        ['A'.repeat(32), ended.token, withdrawn.token].map((token) =>
          askBehind(token, one, { 'x-link-pass': proof }),
        ),
      )
      for (const { status, body, headers } of answers) {
        expect(status).toBe(404)
        expect(body).toEqual(answers[0].body)
        expect([...headers]).toEqual([...answers[0].headers])
      }
    }
  })
})

describe('the password of a link', () => {
  it('POST /shared/{token}/pass answers the right one with a pass, in two cookies for the link’s addresses alone', async () => {
    const { token } = await newLink(owner, sceneId, { password })
    expect(await pass(token, 'counter weight 8')).toMatchObject({
      status: 401,
      body: { detail: 'This is not the password.' },
    })
    const right = await pass(token, password)
    const given = (right.body as { pass: string }).pass
    expect(right.headers.getSetCookie()).toEqual(
      ['/s', '/api/v1/shared'].map(
        (root) =>
          `counterthrow_link=${given}; Path=${root}/${token}; Max-Age=${passSeconds}; HttpOnly; SameSite=Lax`,
      ),
    )
    expect((await open(token, { cookie: `other=1; counterthrow_link=${given}` })).status).toBe(200)
    expect((await call('GET', `/api/v1/shared/${token}?pass=${given}`)).status).toBe(200)
  })

  it('a pass is void for another link, after its time, and once the password is another one', async () => {
    const [one, other] = [
      await newLink(owner, sceneId, { password }),
      await newLink(owner, sceneId, { password }),
    ]
    const given = await passed(one.token)
    expect((await open(other.token, { 'x-link-pass': given })).status).toBe(401)

    const [{ id, password_hash }] =
      await server.sql`select id, password_hash from share_links where id = ${one.link.id}`
    const long = new Date(Date.now() - (passSeconds + 1) * 1000)
    const old = newLinkPass({ id, passwordHash: password_hash }, long)
    expect((await open(one.token, { 'x-link-pass': old })).status).toBe(401)
    const stretched = `${Number(old.split('.')[0]) + 9_999_999}.${old.split('.')[1]}`
    expect((await open(one.token, { 'x-link-pass': stretched })).status).toBe(401)

    expect((await open(one.token, { 'x-link-pass': given })).status).toBe(200)
    await change(one.link.id, { password: 'another one 9' })
    expect((await open(one.token, { 'x-link-pass': given })).status).toBe(401)
    await change(one.link.id, { password: null })
    expect((await open(one.token)).status).toBe(200)
  })

  it('is kept as an Argon2 hash and stands in no answer and no audit row', async () => {
    const { link } = await newLink(owner, sceneId, { password })
    await change(link.id, { password: 'another one 9' })
    const [{ password_hash }] = await server.sql`select password_hash from share_links where id = ${link.id}`
    expect(password_hash).toMatch(/^\$argon2id\$/)
    const rows = await server.sql`select before, after from audit_log where subject = ${`link:${link.id}`}`
    const told = JSON.stringify([rows, link])
    expect(told).not.toContain(password)
    expect(told).not.toContain('another one 9')
    expect(told).not.toContain('$argon2')
    expect(link).toMatchObject({ locked: true })
  })
})

describe('what a link lets', () => {
  it('PATCH /share-links/{id} extends an ended link, pins it and widens it, at once and in the audit log', async () => {
    const { link, token } = await newLink(owner, sceneId)
    await call('POST', `/api/v1/scenes/${sceneId}/versions`, {
      cookie: owner.cookie,
      body: { base: 1, document: sceneOf('single-450', { angleDeg: 22 }) },
    })
    await server.sql`update share_links set ends_at = now() - interval '1 day' where id = ${link.id}`
    expect((await open(token)).status).toBe(404)
    const endsAt = new Date(Date.now() + 7 * 86_400_000).toISOString()
    expect(await change(link.id, { endsAt, version: 1, kind: 'note' })).toMatchObject({
      status: 200,
      body: { link: { state: 'live', endsAt, version: 1, kind: 'note', label: '' } },
    })
    expect((await open(token)).body).toMatchObject({ version: 1, versions: 2, kind: 'note', endsAt })
    const [row] =
      await server.sql`select before, after from audit_log where operation = 'link.change' and subject = ${`link:${link.id}`}`
    expect(row.before).toMatchObject({ kind: 'look', version: null })
    expect(row.after).toMatchObject({ kind: 'note', version: 1, endsAt })
  })

  it('a pinned link says how many versions there are and nothing of the later ones', async () => {
    const own = await newScene(owner)
    const { token } = await newLink(owner, own, { version: 1 })
    const later = { ...sceneOf('single-450', { angleDeg: 77 }) }
    await call('POST', `/api/v1/scenes/${own}/versions`, {
      cookie: owner.cookie,
      body: { base: 1, message: 'secret of version two', document: later },
    })
    const { body } = await open(token)
    expect(body).toMatchObject({ version: 1, versions: 2, document: { view: { angleDeg: 11 } } })
    expect(JSON.stringify(body)).not.toContain('secret')
  })

  it('a withdrawn link is not changed, an end in the past not taken, a version that is not there not pinned', async () => {
    const { link } = await newLink(owner, sceneId)
    expect(await change(link.id, { endsAt: '2020-01-01T00:00:00.000Z' })).toMatchObject({
      status: 422,
      body: { issues: [{ path: 'endsAt', code: 'past' }] },
    })
    expect((await change(link.id, { version: 99 })).status).toBe(404)
    await call('DELETE', `/api/v1/share-links/${link.id}`, owner)
    expect((await change(link.id, { label: 'again' })).status).toBe(409)
  })

  it('ends after 30 days where nothing is said; without an end only by an owner', async () => {
    const sales = await newMember(server.sql, owner.workshopId, 'sales')
    const { link } = await newLink(sales, sceneId)
    const days = (Date.parse(link.endsAt ?? '') - Date.now()) / 86_400_000
    expect(days).toBeGreaterThan(29.9)
    expect(days).toBeLessThan(30)
    const refused = await call('POST', `/api/v1/scenes/${sceneId}/share-links`, {
      cookie: sales.cookie,
      body: { endsAt: null },
    })
    expect(refused.status).toBe(403)
    expect((await change(link.id, { endsAt: null }, sales)).status).toBe(403)
    expect((await newLink(owner, sceneId, { endsAt: null })).link.endsAt).toBeNull()
  })

  it('frames are for named origins: https, or this machine; each other text is refused with its place', async () => {
    const { link } = await newLink(owner, sceneId, {
      frameOrigins: ['https://www.larkspur.example/', ' https://Shop.Example:8443 ', 'http://127.0.0.1:4000'],
    })
    expect(link.frameOrigins).toEqual([
      'https://www.larkspur.example',
      'https://shop.example:8443',
      'http://127.0.0.1:4000',
    ])
    const bad = [
      'http://www.example.com',
      'https://example.com/page',
      'https://me@example.com',
      '*',
      'https://*.example.com',
      "https://a.example; script-src 'self'",
      'https://a;b.example',
      'javascript:alert(1)',
      '',
    ]
    expect(bad.map(originOf)).toEqual(bad.map(() => null))
    expect(await change(link.id, { frameOrigins: ['https://good.example', bad[0]] })).toMatchObject({
      status: 422,
      body: { issues: [{ path: 'frameOrigins.1', fix: expect.stringContaining('https://') }] },
    })
  })
})

describe('GET /api/v1/oembed', () => {
  const describeLink = (url: string, more = '') =>
    call('GET', `/api/v1/oembed?url=${encodeURIComponent(url)}${more}`)

  it('tells the frame of a link that some site may show, within the size asked for', async () => {
    const { url, token } = await newLink(owner, await newScene(owner, 'A "V8" & <b>more</b>'), {
      frameOrigins: ['https://www.larkspur.example'],
    })
    const answer = await describeLink(url, '&maxwidth=500&maxheight=300&format=json')
    expect(answer).toMatchObject({
      status: 200,
      body: { version: '1.0', type: 'rich', width: 500, height: 300 },
    })
    const { html, thumbnail_url } = answer.body as { html: string; thumbnail_url: string }
    expect(html).toContain(`src="http://127.0.0.1:3000/embed/${token}"`)
    expect(html).not.toContain('<b>')
    expect(thumbnail_url).toBe(`http://127.0.0.1:3000/api/v1/shared/${token}/card.png`)
  })

  it('says of a link that no site may frame, of an unknown one and of another address the same', async () => {
    const { url } = await newLink(owner, sceneId)
    const addresses = [
      url,
      url.replace(/.{8}$/, 'AAAAAAAA'),
      'https://elsewhere.example/s/x',
      `${url}/more`,
      'x',
    ]
    const answers = await Promise.all(addresses.map((address) => describeLink(address)))
    for (const { status, body } of answers) {
      expect(status).toBe(404)
      expect(body).toEqual(answers[0].body)
    }
    expect((await describeLink(url, '&format=xml')).status).toBe(422)
  })

  it('tells nothing of a link with a password', async () => {
    const { url } = await newLink(owner, sceneId, {
      password,
      frameOrigins: ['https://www.larkspur.example'],
    })
    expect((await describeLink(url)).status).toBe(401)
  })
})
