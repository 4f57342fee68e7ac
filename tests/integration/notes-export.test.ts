import { beforeAll, describe, expect, it } from 'vitest'
import type { Note } from '@/lib/contracts/notes'
import { placeOnPicture } from '@/lib/pictures/place-on-picture'
import { personOfToken } from '@/lib/auth/person'
import { printNotes } from '@/lib/services/notes/print-notes'
import { runJobs } from '../support/jobs'
import { readPdf } from '../support/paper/read-pdf'
import { call, fetchRoute } from './support/call'
import { preset } from './support/documents'
import { newLink, newScene } from './support/links'
import { anchorOn } from './support/notes'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
let sceneId: string

const ask = (method: string, path: string, body?: object) =>
  call(method, `/api/v1/scenes/${sceneId}/notes${path}`, { cookie: owner.cookie, body })
const formula = '=HYPERLINK("https://example.com","open")'
const long = Array.from({ length: 400 }, (_, index) => `word${index}`).join(' ')

beforeAll(async () => {
  owner = await newOwner('Tamsin Orrelby')
  sceneId = await newScene(owner, 'Single for the racer')
  const anchor = anchorOn('single-450', 'piston:1', { angleDeg: 33.25 })
  const drawing = {
    aspect: 1.6,
    words: 'An arrow to the skirt',
    shapes: [
      { shape: 'arrow', from: [0.1, 0.1], to: [0.5, 0.5] },
      { shape: 'box', from: [0.4, 0.4], to: [0.6, 0.6] },
      {
        shape: 'freehand',
        points: [
          [0.1, 0.1],
          [0.2, 0.3],
          [0.3, 0.2],
        ],
      },
    ],
  }
  const made = [
    { anchor, kind: 'error', heading: formula, words: `First line\nSecond line ${long}`, drawing },
    { anchor, kind: 'question', words: '@SUM(A1:A9), is it new?' },
    { anchor: anchorOn('single-450', 'flywheel'), kind: 'remark', words: 'X'.repeat(4000) },
  ]
  for (const body of made) expect((await ask('POST', '', body)).status).toBe(201)
  await ask('POST', '/1/posts', { words: '-2+3 is what I measured' })
  await ask('POST', '/2/posts', { words: 'A word too many' })
  await ask('DELETE', '/2/posts/2')
  await ask('POST', '/2/settle', { settlement: { reason: 'duplicate', number: 1 }, words: 'Said before' })
  const { token } = await newLink(owner, sceneId, { kind: 'note' })
  const body = { name: 'Delphine "Del" Astercroft', anchor, words: 'Приве́т, 早上好' }
  expect((await call('POST', `/api/v1/shared/${token}/notes`, { body })).status).toBe(201)
})

describe('the review as a file', () => {
  it('GET …/notes.csv has every note with angle, part, thread and state, by number, and no formula', async () => {
    const answer = await ask('GET', '.csv')
    expect(answer.status).toBe(200)
    expect(answer.headers.get('content-type')).toBe('text/csv; charset=utf-8')
    const text = answer.body as string
    const [head] = text.split('\r\n')
    expect(head).toContain('Note,Kind,State,Settled')
    expect(head).toContain('"Crank angle, °"')
    expect(text).toContain(`"'=HYPERLINK(""https://example.com"",""open"")"`)
    expect(text).toContain(`"'@SUM(A1:A9), is it new?"`)
    expect(text).toMatch(/\r\n1,error,open,/)
    expect(text).toMatch(/\r\n2,question,settled,duplicate of note 1,Tamsin Orrelby,/)
    expect(text).toContain('33.25')
    expect(text).toContain('(deleted)')
    expect(text).toContain('"Delphine ""Del"" Astercroft (guest)"')
    expect(text).toContain('-2+3 is what I measured')
    expect(text).not.toMatch(/(^|\r\n|,)"?[=+\-@]/)
    expect(text).not.toContain('A word too many')
    expect((await ask('GET', '.csv')).body).toBe(text)
  })

  it('GET …/notes.json has the same notes whole, in the same order, and obeys the filters', async () => {
    const all = (await ask('GET', '.json')).body as { scene: string; version: number; notes: Note[] }
    expect(all).toMatchObject({ scene: 'Single for the racer', workshop: expect.any(String), version: 1 })
    expect(all.notes.map(({ number }) => number)).toEqual([1, 2, 3, 4])
    expect(all.notes[0]).toMatchObject({ heading: formula, posts: [{ drawing: { aspect: 1.6 } }, {}] })
    expect(all.notes[1].events).toHaveLength(1)
    const some = (await ask('GET', '.json?kind=remark&author=guest')).body as { notes: Note[] }
    expect(some.notes.map(({ number }) => number)).toEqual([4])
    const settled = (await ask('GET', '.csv?state=settled')).body as string
    expect(settled.split('\r\n').filter((line) => /^\d+,/.test(line))).toHaveLength(1)
  })

  it('printNotes() has each note with its view, part, angle, thread and state, and loses no word at an edge', async () => {
    const person = await personOfToken(owner.cookie.split('=')[1])
    const bytes = await printNotes(person, sceneId, {})
    const { pages, info, marked } = await readPdf(bytes)
    expect(marked).toBe(true)
    expect(info).toMatchObject({ Title: 'Single for the racer: notes', Language: 'en' })
    const text = pages.map((page) => page.text).join(' ')
    for (const words of [
      `Note 1: ${formula}`,
      'Error, open',
      'Piston 1 at 33.3°, version 1',
      'Drawn: An arrow to the skirt',
      'Question, settled, duplicate of note 1',
      'Said before',
      '(deleted)',
      'Delphine "Del" Astercroft (guest)',
      'word0 ',
      ' word399',
      '3 open, 1 settled',
    ])
      expect(text.replace(/\s+/g, ' '), words).toContain(words)
    expect(text.replace(/[^X]/g, '')).toHaveLength(4000)
    const order = [...text.matchAll(/Note (\d)\b(?!\d)/g)].map(([, number]) => number)
    expect(order.filter((number, index) => order.indexOf(number) === index)).toEqual(['1', '2', '3', '4'])
    const figures = pages.flatMap(({ roles }) => roles).filter(({ role }) => role === 'Figure')
    expect(figures.map(({ alt }) => alt)).toEqual([
      'Piston 1 at 33.3°, version 1',
      'Piston 1 at 33.3°, version 1',
      'Flywheel at 90.0°, version 1',
      'Piston 1 at 33.3°, version 1',
    ])
    for (const { beyond, width, height } of pages) {
      expect(beyond).toEqual([])
      expect([Math.round(width), Math.round(height)]).toEqual([842, 595])
    }
  })

  it('POST /exports has the notes that match printed in the background, for whoever asked', async () => {
    const wanted = { kind: 'notes-pdf', sceneId, version: 1, filter: { state: 'settled' } }
    const asked = await call('POST', '/api/v1/exports', { cookie: owner.cookie, body: wanted })
    expect(asked.status).toBe(202)
    await runJobs(server.url)
    const { id } = asked.body as { id: string }
    const state = await call('GET', `/api/v1/exports/${id}`, { cookie: owner.cookie })
    expect(state.body).toMatchObject({ state: 'made', fileName: 'notes-version-1.pdf' })
    const file = await fetchRoute('GET', `/api/v1/exports/${id}/file`, { cookie: owner.cookie })
    const { pages } = await readPdf(new Uint8Array(await file.arrayBuffer()))
    expect(pages).toHaveLength(1)
    expect(pages[0].text).toContain('Note 2')
    expect(pages[0].text).toContain('0 open, 1 settled')
    expect(pages[0].text).not.toContain('Note 1')
  })

  it('printNotes() of no note says so', async () => {
    const person = await personOfToken(owner.cookie.split('=')[1])
    const { pages } = await readPdf(await printNotes(person, sceneId, { part: 'liner:1' }))
    expect(pages).toHaveLength(1)
    expect(pages[0].text).toContain('No note matches.')
    expect(pages[0].text).toContain('part liner:1')
  })

  it('printNotes() is refused to whoever may not read them', async () => {
    const other = await newOwner('Of another workshop')
    const stranger = await personOfToken(other.cookie.split('=')[1])
    await expect(printNotes(stranger, sceneId, {})).rejects.toMatchObject({ kind: 'not-found' })
    await expect(printNotes(null, sceneId, {})).rejects.toMatchObject({ kind: 'not-signed-in' })
  })

  it('placeOnPicture() puts a pin in the middle of a picture that looks at it, and lets it ride with its part', () => {
    const drawn = preset('single-450')
    const train = { ...drawn, cylinderDefaults: { ...drawn.cylinderDefaults, offsetMm: 0 } }
    const stroke = train.cylinderDefaults.strokeMm!
    const rod = train.cylinderDefaults.rodLengthMm!
    // the piston pin at top dead centre of an upright cylinder without offset stands at throw + rod
    const top: [number, number, number] = [0, stroke / 2 + rod, train.cylinders[0].axialMm]
    const camera = { yawDeg: 0, pitchDeg: 0, distanceMm: 1000, targetMm: top }
    const pin = { partId: 'piston:1', pointMm: [0, 0, top[2]] as [number, number, number], speedRpm: 3000 }
    const at = (angleDeg: number, cameraNow = camera) =>
      placeOnPicture(train, { ...pin, angleDeg, camera: cameraNow }, 1.6)
    const [x, y] = at(0)!
    expect(x).toBeCloseTo(0.5, 9)
    expect(y).toBeCloseTo(0.5, 9)
    // half a turn on it is the stroke lower: in shares of what a lens of 16° has on the picture at that distance
    const shown = 2 * 1000 * Math.tan((8 * Math.PI) / 180)
    expect(at(180)![1]).toBeCloseTo(0.5 + stroke / shown, 6)
    expect(at(0, { ...camera, targetMm: [0, top[1] + 2000, 0] })).toBeNull()
    expect(placeOnPicture(train, { ...pin, partId: 'piston:7', angleDeg: 0, camera }, 1.6)).toBeNull()
  })
})
