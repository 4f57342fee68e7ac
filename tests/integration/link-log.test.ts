import { beforeAll, describe, expect, it } from 'vitest'
import type { LinkOpening, LinkQuestion } from '@/lib/contracts/share-links'
import { deviceOf, isRobot } from '@/lib/services/device-of'
import { eraseOldOpenings } from '@/lib/services/link-openings'
import { call } from './support/call'
import { linksOf, newLink, newScene } from './support/links'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
const desk = 'Mozilla/5.0 (X11; Linux x86_64) A browser/1.0'
let owner: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner()
  sceneId = await newScene(owner)
})

const count = async (token: string, userAgent = desk, cookie?: string) => {
  const answer = await call('POST', `/api/v1/shared/${token}/openings`, {
    cookie,
    headers: { 'user-agent': userAgent },
  })
  expect(answer.status).toBe(200)
  return (answer.body as { opening: string | null }).opening
}
const look = (token: string, opening: string | null, drawingSeconds: number, figuresSeconds = 0) =>
  call('POST', `/api/v1/shared/${token}/openings/${opening}`, {
    body: { drawingSeconds, figuresSeconds, notesSeconds: 0 },
  })
const log = async (id: string, query = '') => {
  const answer = await call('GET', `/api/v1/share-links/${id}/openings${query}`, { cookie: owner.cookie })
  expect(answer.status).toBe(200)
  return answer.body as { openings: LinkOpening[]; keptDays: number; next: string | null }
}
const linkRow = async (id: string) => (await linksOf(owner, sceneId)).find((link) => link.id === id)
const backdate = (linkId: string, interval: string) =>
  server.sql`update link_openings set opened_at = now() - ${interval}::interval where link_id = ${linkId}`

describe('the openings of a link', () => {
  it('tell when, on what and which version; the time spent on each part grows and is never more than has passed', async () => {
    const { link, token } = await newLink(owner, sceneId)
    const opening = await count(token, 'A browser on a Phone, Mobile')
    await backdate(link.id, '60 seconds')
    for (const [drawing, figures] of [
      [10, 0],
      [25, 12],
      [20, 5],
      [25, 80_000],
    ]) {
      expect((await look(token, opening, drawing, figures)).status).toBe(204)
    }
    const { openings, keptDays } = await log(link.id)
    expect(keptDays).toBe(90)
    expect(openings).toHaveLength(1)
    expect(openings[0]).toMatchObject({ id: opening, device: 'phone', version: 1, drawingSeconds: 25 })
    expect(openings[0].figuresSeconds).toBeGreaterThanOrEqual(60)
    expect(openings[0].figuresSeconds).toBeLessThan(80)
    expect(Object.keys(openings[0]).sort()).toEqual(
      ['device', 'drawingSeconds', 'figuresSeconds', 'id', 'notesSeconds', 'openedAt', 'version'].sort(),
    )
  })

  it('leave out robots and the workshop’s own people, and count a stranger and people of other workshops', async () => {
    const { link, token } = await newLink(owner, sceneId)
    const reviewer = await newMember(server.sql, owner.workshopId, 'reviewer')
    const stranger = await newOwner('Of another workshop')
    for (const agent of ['', 'LinkPreview/2.0', 'somebot/1.1 (+http://bot.example)', 'Mail scanner 3'])
      expect(await count(token, agent)).toBeNull()
    for (const { cookie } of [owner, reviewer]) expect(await count(token, desk, cookie)).toBeNull()
    expect((await linkRow(link.id))?.opened).toBe(0)
    expect(await count(token, desk, stranger.cookie)).not.toBeNull()
    expect(await count(token)).not.toBeNull()
    expect((await linkRow(link.id))?.opened).toBe(2)
  })

  it('one link’s visitor cannot write into the openings of another', async () => {
    const [one, other] = [await newLink(owner, sceneId), await newLink(owner, sceneId)]
    const opening = await count(one.token)
    expect((await look(other.token, opening, 1)).status).toBe(204)
    expect((await log(one.link.id)).openings[0].drawingSeconds).toBe(0)
  })

  it('come in pages, newest first, each once', async () => {
    const { link, token } = await newLink(owner, sceneId)
    const counted = []
    for (let i = 0; i < 5; i++) counted.push(await count(token))
    const seen: string[] = []
    let before = ''
    do {
      const page = await log(link.id, `?limit=2${before}`)
      seen.push(...page.openings.map(({ id }) => id))
      before = page.next ? `&before=${page.next}` : ''
    } while (before)
    expect(seen).toEqual(counted.reverse())
  })

  it('are exported whole as JSON and as CSV with units in the heads', async () => {
    const { link, token } = await newLink(owner, sceneId, { label: '=1+1' })
    const opening = await count(token)
    const json = await call('GET', `/api/v1/share-links/${link.id}/openings.json`, { cookie: owner.cookie })
    expect(json.body).toMatchObject({ link: { id: link.id }, openings: [{ id: opening }] })
    const csv = await call('GET', `/api/v1/share-links/${link.id}/openings.csv`, { cookie: owner.cookie })
    expect(csv.headers.get('content-type')).toContain('text/csv')
    expect(String(csv.body).split('\r\n')[0]).toBe(
      'Opened at,Device,Version,"Drawing, s","Figures, s","Notes, s"',
    )
    expect(String(csv.body)).toContain(',desktop,1,0,0,0')
  })

  it('are erased on request with the count, and the audit log says how many', async () => {
    const { link, token } = await newLink(owner, sceneId)
    await count(token)
    await count(token)
    const erase = () => call('DELETE', `/api/v1/share-links/${link.id}/openings`, owner)
    expect((await erase()).body).toEqual({ erased: 2 })
    expect(await linkRow(link.id)).toMatchObject({ opened: 0, lastOpenedAt: null })
    expect((await log(link.id)).openings).toEqual([])
    const [row] =
      await server.sql`select before from audit_log where operation = 'link.erase' and subject = ${`link:${link.id}`}`
    expect(row.before).toEqual({ opened: 2, openings: 2 })
    expect((await erase()).body).toEqual({ erased: 0 })
  })

  it('are forgotten when they are older than their workshop keeps them, and others stay', async () => {
    const { link, token } = await newLink(owner, sceneId)
    await count(token)
    await backdate(link.id, '31 days')
    const fresh = await newLink(owner, sceneId)
    await count(fresh.token)
    expect(await eraseOldOpenings(new Date())).toBe(0)
    await server.sql`update workshops set openings_kept_days = 30 where id = ${owner.workshopId}`
    expect(await eraseOldOpenings(new Date())).toBe(1)
    expect(await eraseOldOpenings(new Date())).toBe(0)
    expect((await log(fresh.link.id)).openings).toHaveLength(1)
    await server.sql`update workshops set openings_kept_days = 90 where id = ${owner.workshopId}`
  })

  it('keep nothing that tells one visitor from another', async () => {
    const columns =
      await server.sql`select column_name from information_schema.columns where table_name = 'link_openings'`
    expect(columns.map(({ column_name }) => column_name).sort()).toEqual([
      ...['device', 'drawing_seconds', 'figures_seconds', 'id', 'link_id', 'notes_seconds'],
      ...['opened_at', 'version'],
    ])
  })
})

describe('deviceOf(), isRobot()', () => {
  it('tell phone, tablet and desktop by general words', () => {
    expect(deviceOf('Something (Android 15; Mobile)')).toBe('phone')
    expect(deviceOf('Something (Android 15)')).toBe('tablet')
    expect(deviceOf('Something (a Tablet)')).toBe('tablet')
    expect(deviceOf(desk)).toBe('desktop')
  })

  it('a browser is no robot, what names itself so is', () => {
    expect(isRobot(desk)).toBe(false)
    for (const name of [
      'Xbot/1',
      'web crawler',
      'a spider',
      'url-checker',
      'page-fetcher',
      'x (+https://x.example)',
    ])
      expect(isRobot(name), name).toBe(true)
  })
})

describe('a question from a link’s page', () => {
  const asked = {
    name: 'Delphine Astercroft',
    email: 'delphine@example.com',
    question: 'Does the rod clear the skirt?',
    angleDeg: 112.5,
    view: 'end view',
    writtenForMs: 9_000,
  }
  const ask = (token: string, more: object = {}) =>
    call('POST', `/api/v1/shared/${token}/questions`, { body: { ...asked, ...more } })
  const mailsTo = (email: string) =>
    server.sql`select template, to_email, data from mails where to_email = ${email} order by created_at, id`

  it('is kept with what was before the visitor, told once to whoever made the link and copied to the visitor', async () => {
    const fenn = await newMember(server.sql, owner.workshopId, 'sales')
    const { link, token } = await newLink(fenn, sceneId)
    const email = 'delphine.one@example.com'
    expect((await ask(token, { email })).status).toBe(202)
    const answer = await call('GET', `/api/v1/share-links/${link.id}/questions`, { cookie: owner.cookie })
    expect((answer.body as { questions: LinkQuestion[] }).questions).toMatchObject([
      { name: asked.name, email, question: asked.question, angleDeg: 112.5, view: 'end view', version: 1 },
    ])
    expect(await mailsTo(fenn.email)).toMatchObject([
      {
        template: 'question',
        data: { visitor: asked.name, question: asked.question, step: 'at 112.5°, end view' },
      },
    ])
    expect(await mailsTo(email)).toMatchObject([
      { template: 'question-copy', data: { question: asked.question } },
    ])
    expect((await linkRow(link.id))?.questions).toBe(1)
  })

  it('goes to an owner once its maker has left the workshop', async () => {
    const leaver = await newMember(server.sql, owner.workshopId, 'sales')
    const { token } = await newLink(leaver, sceneId)
    await server.sql`delete from memberships where user_id = ${leaver.id}`
    await ask(token, { email: 'delphine.two@example.com' })
    expect(await mailsTo(leaver.email)).toHaveLength(0)
    expect((await mailsTo(owner.email)).filter(({ template }) => template === 'question')).toHaveLength(1)
  })

  it('sends no more than three copies a day to one address, whatever link they come from', async () => {
    const email = 'somebody.elses@example.com'
    for (let i = 0; i < 5; i++) {
      const { token } = await newLink(owner, sceneId)
      expect((await ask(token, { email })).status).toBe(202)
    }
    expect(await mailsTo(email)).toHaveLength(3)
  })

  it('is dropped without a word when the hidden field is filled in, refused when it comes too soon', async () => {
    const { link, token } = await newLink(owner, sceneId)
    const email = 'robot@example.com'
    expect((await ask(token, { email, website: 'https://spam.example' })).status).toBe(202)
    expect(await ask(token, { email, writtenForMs: 300 })).toMatchObject({
      status: 422,
      body: { issues: [{ path: 'writtenForMs', code: 'too-soon' }] },
    })
    expect(await mailsTo(email)).toHaveLength(0)
    expect((await linkRow(link.id))?.questions).toBe(0)
  })

  it('is refused with its place: no address, no words, too many words', async () => {
    const { token } = await newLink(owner, sceneId)
    for (const [path, value] of [
      ['email', 'nobody'],
      ['question', ' '],
      ['question', 'x'.repeat(2_001)],
      ['name', ''],
    ]) {
      expect(await ask(token, { [path]: value })).toMatchObject({ status: 422, body: { issues: [{ path }] } })
    }
  })

  it('is erased on request, names and addresses with it', async () => {
    const { link, token } = await newLink(owner, sceneId)
    await ask(token, { email: 'delphine.three@example.com' })
    expect((await call('DELETE', `/api/v1/share-links/${link.id}/questions`, owner)).body).toEqual({
      erased: 1,
    })
    const kept = await server.sql`select * from link_questions where link_id = ${link.id}`
    expect(kept).toHaveLength(0)
    const rows = await server.sql`select before, after from audit_log where subject = ${`link:${link.id}`}`
    expect(JSON.stringify(rows)).not.toContain('delphine.three')
  })
})
