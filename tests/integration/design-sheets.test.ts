import { validateBytes } from 'gltf-validator'
import sharp from 'sharp'
import { beforeAll, describe, expect, it } from 'vitest'
import { readPdf } from '@/tests/support/paper/read-pdf'
import type { OpenedScene } from '@/lib/contracts/scenes'
import type { Issue } from '@/scene/model/issue'
import { call, fetchRoute, type Asked } from './support/call'
import { preset, sceneOf } from './support/documents'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

useServer()
let owner: Someone
let stranger: Someone
let scene: OpenedScene['scene']

beforeAll(async () => {
  owner = await newOwner()
  stranger = await newOwner()
  const body = { document: sceneOf('v2-45-1600', { angleDeg: 40 }), title: 'Twin for the stand' }
  const created = await call('POST', '/api/v1/scenes', { cookie: owner.cookie, body })
  scene = (created.body as OpenedScene).scene
})

const post = (path: string, body: unknown, asked: Asked = {}) =>
  fetchRoute('POST', `/api/v1/${path}`, { ...asked, body })
const bytesOf = async (response: Response) => new Uint8Array(await response.arrayBuffer())
const wordsOf = async (response: Response) => {
  const { pages } = await readPdf(await bytesOf(response))
  return pages.map(({ text }) => text).join(' ')
}
const issuesOf = async (response: Response) => ((await response.json()) as { issues: Issue[] }).issues

describe('POST /design-sheets', () => {
  it('POST /design-sheets answers a stranger with a tagged PDF that has the drawing', async () => {
    const response = await post('design-sheets', { train: preset('v8x-5000'), speedRpm: 7000, angleDeg: 30 })
    expect([response.status, response.headers.get('content-type')]).toEqual([200, 'application/pdf'])
    const { pages, marked, info } = await readPdf(await bytesOf(response))
    expect([marked, info.Language]).toEqual([true, 'en'])
    expect(pages[0].text).toContain('Crank angle 30.0°, at 7,000 rpm')
    const alts = pages[0].roles.filter(({ role }) => role === 'Figure').map(({ alt }) => alt)
    expect(alts).toContain(
      '90° V8 5.0 L, cross plane: 8 cylinders in two banks, 90° apart, drawn at crank angle 30.0°.',
    )
    expect(pages[0].text).toContain('not saved')
  })

  it('POST /design-sheets prints scene and version for somebody who may read it, and says when it was changed', async () => {
    const of = { sceneId: scene.id, version: 1 }
    const same = await wordsOf(await post('design-sheets', { scene: sceneOf('v2-45-1600'), of }, owner))
    expect(same).toContain('Twin for the stand')
    expect(same.replaceAll(' ', '')).toContain(scene.id)
    expect(same).not.toContain('changed since')
    const other = await wordsOf(await post('design-sheets', { scene: sceneOf('i4-2000'), of }, owner))
    expect(other).toContain('1, changed since')
  })

  it('POST /design-sheets prints no version for a stranger or somebody of another workshop', async () => {
    const body = { scene: sceneOf('v2-45-1600'), of: { sceneId: scene.id, version: 1 } }
    expect((await post('design-sheets', body)).status).toBe(401)
    const elsewhere = await post('design-sheets', body, stranger)
    expect(elsewhere.status).toBe((await fetchRoute('GET', `/api/v1/scenes/${scene.id}`, stranger)).status)
  })

  it.each([
    ['nothing', {}, 'scene'],
    ['both', { scene: sceneOf('i4-2000'), train: preset('i4-2000') }, 'scene'],
    ['another paper', { train: preset('i4-2000'), paper: 'A3' }, 'paper'],
    ['a bad train', { train: { ...preset('i4-2000'), firingOrder: ['1'] } }, 'train.firingOrder'],
  ])('POST /design-sheets refuses %s with its path', async (_, body, path) => {
    const response = await post('design-sheets', body)
    expect(response.status).toBe(422)
    expect((await issuesOf(response)).map((issue) => issue.path)).toContain(path)
  })
})

describe('GET /scenes/{id}/versions/{number}/design-sheet.pdf', () => {
  const address = (number: number, more = '') =>
    `/api/v1/scenes/${scene.id}/versions/${number}/design-sheet.pdf${more}`

  it('is the sheet of that version, on the paper asked for', async () => {
    const response = await fetchRoute('GET', address(1, '?paper=Letter&units=us'), owner)
    expect(response.status).toBe(200)
    const { pages } = await readPdf(await bytesOf(response))
    expect(pages[0].width).toBeCloseTo(792, 1)
    const text = pages.map((page) => page.text).join(' ')
    expect(text).toContain('Twin for the stand')
    expect(text).toContain('Crank angle 40.0°')
    expect(text).toContain('lbf ft')
  })

  it('is not there for a stranger, another workshop, or a version that is none', async () => {
    expect((await fetchRoute('GET', address(1))).status).toBe(401)
    expect([403, 404]).toContain((await fetchRoute('GET', address(1), stranger)).status)
    expect((await fetchRoute('GET', address(9), owner)).status).toBe(404)
  })
})

describe('POST /models', () => {
  it.each(['glb', 'gltf'] as const)('POST /models answers a valid %s', async (form) => {
    const response = await post('models', { train: preset('r7-11'), angleDeg: 100, form })
    const media = { glb: 'model/gltf-binary', gltf: 'model/gltf+json' }[form]
    expect([response.status, response.headers.get('content-type')]).toEqual([200, media])
    const report = await validateBytes(await bytesOf(response), { format: form })
    expect(report.issues).toMatchObject({ numErrors: 0, numWarnings: 0 })
  })

  it('POST /models leaves out what the scene hides', async () => {
    const size = async (hidden: ('bores' | 'crank')[]) => {
      const response = await post('models', { scene: sceneOf('i4-2000', { hidden }) })
      return (await validateBytes(await bytesOf(response))).info.totalTriangleCount
    }
    expect(await size(['bores'])).toBeLessThan(await size([]))
  })
})

describe('POST /pictures', () => {
  it('POST /pictures draws on white at the size asked for', async () => {
    const response = await post('pictures', { train: preset('i3-1000'), width: 400, height: 300 })
    expect([response.status, response.headers.get('content-type')]).toEqual([200, 'image/png'])
    const { data, info } = await sharp(await bytesOf(response))
      .removeAlpha()
      .raw()
      .toBuffer({ resolveWithObject: true })
    expect([info.width, info.height]).toEqual([400, 300])
    expect([...data.subarray(0, 3)]).toEqual([255, 255, 255])
    expect(data.some((level) => level < 60)).toBe(true)
  })

  it('POST /pictures refuses a size that is too large', async () => {
    const response = await post('pictures', { train: preset('i3-1000'), width: 9000 })
    expect((await issuesOf(response)).map(({ path }) => path)).toEqual(['width'])
  })
})
