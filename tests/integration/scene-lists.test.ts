import { beforeAll, describe, expect, it } from 'vitest'
import type { SceneSummary, VersionSummary } from '@/lib/contracts/scenes'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone

type Page = { scenes: SceneSummary[]; next: string | null }
const titles = ['beta 10%', 'Alpha', 'gamma_1', 'alpha', 'Ärmel', 'epsilon', 'Zeta']

async function create(title: string) {
  const answer = await call('POST', '/api/v1/scenes', {
    cookie: owner.cookie,
    body: { title, document: sceneOf('single-450') },
  })
  return (answer.body as { scene: SceneSummary }).scene.id
}

async function pages(query: string): Promise<string[][]> {
  const found: string[][] = []
  let after: string | null = ''
  while (after !== null) {
    const { body, status } = await call('GET', `/api/v1/scenes?${query}${after && `&after=${after}`}`, owner)
    expect(status).toBe(200)
    const page = body as Page
    found.push(page.scenes.map(({ title }) => title))
    after = page.next
  }
  return found
}

describe('GET /scenes', () => {
  beforeAll(async () => {
    owner = await newOwner()
    for (const title of titles) await create(title)
  })

  it('GET /scenes pages through all of them once, latest change first', async () => {
    expect(await pages('limit=3')).toEqual([
      ['Zeta', 'epsilon', 'Ärmel'],
      ['alpha', 'gamma_1', 'Alpha'],
      ['beta 10%'],
    ])
  })

  it('GET /scenes?sort=title sorts without regard to case and pages across equal titles', async () => {
    const sorted = (await pages('limit=1&sort=title')).flat()
    expect(sorted.map((title) => title.toLowerCase())).toEqual([
      'alpha',
      'alpha',
      'ärmel',
      'beta 10%',
      'epsilon',
      'gamma_1',
      'zeta',
    ])
    expect(new Set(sorted).size).toBe(titles.length)
    expect((await pages('limit=2&sort=title&order=down')).flat()).toEqual(sorted.reverse())
  })

  it('GET /scenes keeps its place when a scene is added between two pages', async () => {
    const first = (await call('GET', '/api/v1/scenes?limit=2', owner)).body as Page
    const added = await create('Added')
    const second = (await call('GET', `/api/v1/scenes?limit=2&after=${first.next}`, owner)).body as Page
    expect(second.scenes.map(({ title }) => title)).toEqual(['Ärmel', 'alpha'])
    await call('POST', `/api/v1/scenes/${added}/archive`, owner)
  })

  it('GET /scenes pages across equal times', async () => {
    await server.sql`update scenes set updated_at = '2024-05-01T10:00:00.123Z' where archived_at is null`
    expect((await pages('limit=2')).flat().sort()).toEqual([...titles].sort())
  })

  it('GET /scenes?search= takes text as it is written, percent signs and underscores too', async () => {
    const search = async (text: string) =>
      (await pages(`sort=title&search=${encodeURIComponent(text)}`)).flat()
    expect(await search('ALPHA')).toHaveLength(2)
    expect(await search('ÄRM')).toEqual(['Ärmel'])
    expect(await search('0%')).toEqual(['beta 10%'])
    expect(await search('a_1')).toEqual(['gamma_1'])
    expect(await search('\\')).toEqual([])
  })

  it('GET /scenes refuses a sorting that is not on the list, and a cursor of another sorting or of none', async () => {
    const { body } = await call('GET', '/api/v1/scenes?limit=1', owner)
    const { next } = body as Page
    const status = async (query: string) => (await call('GET', `/api/v1/scenes?${query}`, owner)).status
    expect(await status('sort=password_hash')).toBe(422)
    expect(await status(`sort=title&after=${next}`)).toBe(400)
    expect(await status('after=nonsense')).toBe(400)
    expect(await status(`after=${Buffer.from('["title","x",1]').toString('base64url')}&sort=title`)).toBe(400)
  })

  it('GET /scenes/{id}/versions pages newest first', async () => {
    const id = await create('Many')
    for (let base = 1; base < 5; base++) {
      const body = { base, message: `Saved on ${base}`, document: sceneOf('single-450') }
      await call('POST', `/api/v1/scenes/${id}/versions`, { cookie: owner.cookie, body })
    }
    const page = async (query: string) =>
      (await call('GET', `/api/v1/scenes/${id}/versions?${query}`, owner)).body as {
        versions: VersionSummary[]
        next: number | null
      }
    const first = await page('limit=3')
    expect(first.versions.map(({ number }) => number)).toEqual([5, 4, 3])
    expect(first.next).toBe(3)
    const second = await page('limit=3&before=3')
    expect(second.versions.map(({ number, parent }) => [number, parent])).toEqual([
      [2, 1],
      [1, null],
    ])
    expect(second.next).toBeNull()
  })
})

describe('GET /scenes?layout=', () => {
  const presets = ['single-450', 'i3-1000', 'v2-90-1000', 'v8x-5000', 'r7-11']

  beforeAll(async () => {
    owner = await newOwner()
    for (const preset of presets) {
      const body = { title: preset, document: sceneOf(preset) }
      expect((await call('POST', '/api/v1/scenes', { cookie: owner.cookie, body })).status).toBe(201)
    }
  })

  it('GET /scenes?layout= keeps scenes by the banks that carry cylinders, and pages through them', async () => {
    const sorted = async (layout: string) => (await pages(`limit=1&layout=${layout}`)).flat().sort()
    expect(await sorted('single')).toEqual(['single-450'])
    expect(await sorted('in-line')).toEqual(['i3-1000'])
    expect(await sorted('two-banks')).toEqual(['v2-90-1000', 'v8x-5000'])
    expect(await sorted('more-banks')).toEqual(['r7-11'])
    expect((await call('GET', '/api/v1/scenes?layout=star', owner)).status).toBe(422)
  })

  it('GET /scenes tells how each is laid out and fires', async () => {
    const { scenes } = (await call('GET', '/api/v1/scenes?sort=title', owner)).body as Page
    const told = Object.fromEntries(scenes.map(({ title, layout, firing }) => [title, [layout, firing]]))
    expect(told).toMatchObject({
      'single-450': ['One cylinder', 'once every 720°'],
      'i3-1000': ['3 cylinders in line', 'every 240°'],
      'v8x-5000': ['8 cylinders in two banks, 90° apart', 'every 90°'],
      'v2-90-1000': ['2 cylinders in two banks, 90° apart', '450-270°'],
    })
  })
})
