import { join } from 'node:path'
import { NextRequest } from 'next/server'
import { beforeAll, describe, expect, it } from 'vitest'
import { POST as passFrame } from '@/app/embed/[token]/pass/route'
import { POST as passPage } from '@/app/s/[token]/pass/route'
import { proxy } from '@/proxy'
import { call } from './support/call'
import { newLink, newScene } from './support/links'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

interface Rule {
  source: string
  headers: { key: string; value: string }[]
}

/** What the framework sends with each page, as its settings say. */
async function pageHeaders(): Promise<Rule[]> {
  const settings = (await import(join(process.cwd(), 'next.config.mjs'))) as {
    default: { headers(): Promise<Rule[]> }
  }
  return settings.default.headers()
}
const origins = ['https://www.larkspur.example', 'https://shop.example:8443']
const password = 'counter weight 7'
let owner: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner()
  sceneId = await newScene(owner)
})

async function framesOf(token: string): Promise<string | undefined> {
  const answer = await proxy(new NextRequest(`http://127.0.0.1:3000/embed/${token}`))
  return /frame-ancestors ([^;]*)/.exec(answer.headers.get('content-security-policy') ?? '')?.[1]
}

describe('the sites that may frame a link', () => {
  it('are named in its frame’s headers, exactly', async () => {
    const { token } = await newLink(owner, sceneId, { frameOrigins: origins })
    expect(await framesOf(token)).toBe(origins.join(' '))
  })

  it('are none, alike, for a link that names none, an ended, a withdrawn and an unknown one', async () => {
    const plain = await newLink(owner, sceneId)
    const ended = await newLink(owner, sceneId, { frameOrigins: origins })
    const withdrawn = await newLink(owner, sceneId, { frameOrigins: origins })
    await server.sql`update share_links set ends_at = now() where id = ${ended.link.id}`
    await call('DELETE', `/api/v1/share-links/${withdrawn.link.id}`, owner)
    for (const token of [plain.token, ended.token, withdrawn.token, 'A'.repeat(32), '%E0%A4%A'])
      expect(await framesOf(token)).toBe("'none'")
  })

  it('may frame no other page: everything but /embed says so, in both words', async () => {
    const rules = await pageHeaders()
    const sent = (path: string) =>
      rules
        .filter(({ source }) => new RegExp(`^${source.replace('/:path*', '(?:/.*)?')}$`).test(path))
        .flatMap(({ headers }) => headers.map(({ key, value }) => [key.toLowerCase(), value] as const))
    for (const path of ['/', '/s/abc', '/bench', '/scenes', '/embedded', '/api/v1/shared/abc/poster.png']) {
      const headers = new Map(sent(path))
      expect(headers.get('content-security-policy'), path).toContain("frame-ancestors 'none'")
      expect(headers.get('x-frame-options'), path).toBe('DENY')
    }
    // the proxy's policy takes this one's place; without the proxy nobody may frame it
    const framed = new Map(sent('/embed/abc'))
    expect(framed.get('content-security-policy')).toContain("frame-ancestors 'none'")
    expect(framed.has('x-frame-options')).toBe(false)
  })

  it('a link’s pages are for no index, no referrer and no store', async () => {
    const rules = await pageHeaders()
    for (const source of ['/s/:path*', '/embed/:path*']) {
      const headers = Object.fromEntries(
        rules.find((rule) => rule.source === source)?.headers.map(({ key, value }) => [key, value]) ?? [],
      )
      expect(headers).toEqual({
        'Referrer-Policy': 'no-referrer',
        'X-Robots-Tag': 'noindex, nofollow',
        'Cache-Control': 'private, no-store',
      })
    }
  })
})

describe('a password given by a plain form', () => {
  const send = (root: '/s' | '/embed', token: string, word: string) => {
    const body = new URLSearchParams({ password: word })
    const request = new Request(`http://127.0.0.1:3000${root}/${token}/pass`, { method: 'POST', body })
    const params = Promise.resolve({ token })
    return root === '/s' ? passPage(request, { params }) : passFrame(request, { params })
  }

  it('leads back to the page with a pass in cookies, of a frame with the pass in the address', async () => {
    const { token } = await newLink(owner, sceneId, { password, frameOrigins: origins })
    const page = await send('/s', token, password)
    expect([page.status, page.headers.get('location')]).toEqual([303, `/s/${token}`])
    expect(page.headers.getSetCookie()).toHaveLength(2)
    const frame = await send('/embed', token, password)
    expect(frame.headers.getSetCookie()).toHaveLength(0)
    const pass = frame.headers.get('location')?.split('?pass=')[1] ?? ''
    expect((await call('GET', `/api/v1/shared/${token}?pass=${pass}`)).status).toBe(200)
  })

  it('says a wrong one was wrong, and nothing more for a link that is not there', async () => {
    const { token } = await newLink(owner, sceneId, { password })
    expect((await send('/s', token, 'no')).headers.get('location')).toBe(`/s/${token}?said=wrong`)
    const unknown = 'B'.repeat(32)
    expect((await send('/s', unknown, 'no')).headers.get('location')).toBe(`/s/${unknown}`)
  })
})
