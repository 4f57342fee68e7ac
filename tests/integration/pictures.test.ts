import { beforeAll, describe, expect, it } from 'vitest'
import sharp from 'sharp'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { fetchRoute } from './support/call'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

useServer()
let owner: Someone
let scene: OpenedScene['scene']
let poster: string
let linkId: string

const bytesOf = async (response: Response) => Buffer.from(await response.arrayBuffer())

beforeAll(async () => {
  owner = await newOwner()
  const document = sceneOf('v2-45-1600', { angleDeg: 40 })
  const created = await call('POST', '/api/v1/scenes', { cookie: owner.cookie, body: { document } })
  scene = (created.body as OpenedScene).scene
  const made = await call('POST', `/api/v1/scenes/${scene.id}/share-links`, {
    cookie: owner.cookie,
    body: {},
  })
  const { url, link } = made.body as { url: string; link: { id: string } }
  poster = `/api/v1/shared/${url.split('/s/')[1]}/poster.png`
  linkId = link.id
})

/** How many different colours, and that of the corner, which is paper. */
async function look(png: Buffer) {
  const { data, info } = await sharp(png).removeAlpha().raw().toBuffer({ resolveWithObject: true })
  const colours = new Set<number>()
  for (let i = 0; i < data.length; i += 3) colours.add(data.readUIntBE(i, 3))
  return { width: info.width, height: info.height, corner: [...data.subarray(0, 3)], colours: colours.size }
}

/** The palette may be a level off, which nobody sees against the page. */
function expectPaper([red, green, blue]: number[], paper: number) {
  const wanted = [paper >> 16, (paper >> 8) & 255, paper & 255]
  const off = [red, green, blue].map((level, channel) => Math.abs(level - wanted[channel]))
  expect(Math.max(...off)).toBeLessThanOrEqual(1)
}

describe('pictures', () => {
  it('GET /scenes/{id}/thumbnail.png is a drawing of the scene on the paper of the theme', async () => {
    const light = await fetchRoute('GET', scene.thumbnailUrl, owner)
    expect(light.headers.get('content-type')).toBe('image/png')
    const seen = await look(await bytesOf(light))
    expect(seen).toMatchObject({ width: 288, height: 192 })
    expectPaper(seen.corner, 0xf5f2ea)
    expect(seen.colours).toBeGreaterThan(10)
    const dark = await fetchRoute('GET', `${scene.thumbnailUrl}&theme=dark`, owner)
    expectPaper((await look(await bytesOf(dark))).corner, 0x14181b)
  })

  it('GET /scenes/{id}/thumbnail.png shows the version asked for, and is not sent again while it is the same', async () => {
    const first = await fetchRoute('GET', scene.thumbnailUrl, owner)
    const tag = first.headers.get('etag')!
    const again = await fetchRoute('GET', scene.thumbnailUrl, { ...owner, headers: { 'if-none-match': tag } })
    expect([again.status, (await bytesOf(again)).length]).toEqual([304, 0])
    const body = { base: 1, document: sceneOf('v2-45-1600', { angleDeg: 90 }) }
    await call('POST', `/api/v1/scenes/${scene.id}/versions`, { cookie: owner.cookie, body })
    const second = await fetchRoute('GET', `/api/v1/scenes/${scene.id}/thumbnail.png`, owner)
    expect(second.headers.get('etag')).not.toBe(tag)
    const old = await fetchRoute('GET', scene.thumbnailUrl, owner)
    expect(old.headers.get('etag')).toBe(tag)
  })

  it('GET /shared/{token}/poster.png shows a stranger the scene while the link lives, and counts no opening', async () => {
    const open = await fetchRoute('GET', poster)
    expect(open.status).toBe(200)
    const picture = await bytesOf(open)
    expect(await look(picture)).toMatchObject({ width: 1280, height: 800 })
    expect(picture.length).toBeLessThan(150_000)
    const list = await call('GET', `/api/v1/scenes/${scene.id}/share-links`, owner)
    expect(list.body).toMatchObject({ links: [{ opened: 0 }] })
    await call('DELETE', `/api/v1/share-links/${linkId}`, owner)
    expect((await fetchRoute('GET', poster)).status).toBe(404)
  })

  it('GET /presets/{id}/poster.png shows a preset, and 404 for none', async () => {
    expect((await fetchRoute('GET', '/api/v1/presets/v8x-5000/poster.png')).status).toBe(200)
    expect((await fetchRoute('GET', '/api/v1/presets/none/poster.png')).status).toBe(404)
  })
})
