import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { expect, type Page } from '@playwright/test'

const presets = fileURLToPath(new URL('../../../scene/model/presets', import.meta.url))

/** What the page's own scripts would send: the session's cookies and where the request comes from. */
async function post(page: Page, path: string, data: object) {
  const answer = await page.request.post(path, { data, headers: { 'sec-fetch-site': 'same-origin' } })
  expect(answer.status(), await answer.text()).toBe(201)
  return answer.json()
}

const overlays = {
  ...{
    gas: false,
    inertia: false,
    total: true,
    shaking: true,
    orbit: true,
    firing: true,
    pressure: false,
    labels: true,
  },
  on: { pistons: true, crankPins: false, mains: false },
}

/** Saves a preset as a scene of whoever is signed in on the page, without drawing anything. */
export async function saveScene(page: Page, preset: string, view: object = {}): Promise<string> {
  const train = JSON.parse(readFileSync(`${presets}/${preset}.json`, 'utf8'))
  const still = { angleDeg: 0, speedRpm: 3000, slowdown: 200, reverse: false, playing: false }
  const looks = { camera: null, hidden: [], ghost: [], sectionAxialMm: null, overlays }
  const document = { format: 'scene/1', train, view: { ...still, ...looks, ...view } }
  const { scene } = await post(page, '/api/v1/scenes', { document })
  return scene.id
}

/** The address of a new share link to a scene. */
export async function shareScene(page: Page, sceneId: string, link: object = {}): Promise<string> {
  const { url } = await post(page, `/api/v1/scenes/${sceneId}/share-links`, link)
  return new URL(url).pathname
}
