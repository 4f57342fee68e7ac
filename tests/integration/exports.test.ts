import { beforeAll, describe, expect, it } from 'vitest'
import type { ExportAnswer } from '@/lib/contracts/exports'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { runJobs } from '../support/jobs'
import { readPdf } from '../support/paper/read-pdf'
import { call, fetchRoute } from './support/call'
import { sceneOf } from './support/documents'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner()
  const body = { document: sceneOf('v2-45-1600') }
  sceneId = ((await call('POST', '/api/v1/scenes', { ...owner, body })).body as OpenedScene).scene.id
})

const ask = (who: Someone, more: object = {}) =>
  call('POST', '/api/v1/exports', { ...who, body: { kind: 'design-sheet', sceneId, version: 1, ...more } })
const asked = async (who: Someone) => (await ask(who)).body as ExportAnswer
const state = (who: Someone, id: string) => call('GET', `/api/v1/exports/${id}`, who)

describe('exports', () => {
  it('POST /exports puts a wish down at once; a worker makes the file, which is then read back', async () => {
    const answer = await ask(owner, { paper: 'Letter', units: 'us' })
    expect(answer).toMatchObject({ status: 202, body: { state: 'waiting', fileUrl: null, version: 1 } })
    const { id } = answer.body as ExportAnswer
    expect((await fetchRoute('GET', `/api/v1/exports/${id}/file`, owner)).status).toBe(404)
    await runJobs(server.url)
    const made = (await state(owner, id)).body as ExportAnswer
    expect(made).toMatchObject({ state: 'made', fileName: 'design-sheet-version-1.pdf', reason: null })
    const file = await fetchRoute('GET', made.fileUrl!, owner)
    expect(file.headers.get('content-type')).toBe('application/pdf')
    const { pages } = await readPdf(new Uint8Array(await file.arrayBuffer()))
    expect(pages.length).toBeGreaterThan(0)
    const [row] = await server.sql`select operation, after from audit_log where operation = 'export.ask'`
    expect(row.after).toEqual({ kind: 'design-sheet', version: 1 })
  })

  it('the job carried out twice makes one file and changes nothing the second time', async () => {
    const { id } = await asked(owner)
    await runJobs(server.url)
    const rows = () => server.sql`select state, sha256(file) as file from exports where id = ${id}`
    const before = await rows()
    await server.sql`select graphile_worker.add_job('export.make', json_build_object('exportId', ${id}::text))`
    await runJobs(server.url)
    expect(await rows()).toEqual(before)
  })

  it('is nobody else’s, not even of the same workshop', async () => {
    const { id } = await asked(owner)
    const colleague = await newMember(server.sql, owner.workshopId, 'owner')
    expect((await state(colleague, id)).status).toBe(404)
    expect((await call('GET', `/api/v1/exports/${id}/file`, colleague)).status).toBe(404)
    expect((await call('GET', `/api/v1/exports/${id}`)).status).toBe(401)
  })

  it('who may not read the scene any more gets neither a file made nor one that is there', async () => {
    const member = await newMember(server.sql, owner.workshopId, 'sales')
    const made = await asked(member)
    await runJobs(server.url)
    const waiting = await asked(member)
    await server.sql`delete from memberships where user_id = ${member.id}`
    await runJobs(server.url)
    expect((await state(member, made.id)).status).toBe(404)
    expect(await server.sql`select state, reason, file from exports where id = ${waiting.id}`).toMatchObject([
      { state: 'failed', file: null },
    ])
  })

  it('refuses a version that is not there and a kind that is not known', async () => {
    expect((await ask(owner, { version: 9 })).status).toBe(404)
    const unknown = await ask(owner, { kind: 'poem' })
    expect(unknown).toMatchObject({ status: 422, body: { issues: [{ path: 'kind' }] } })
  })

  it('ends after seven days and is removed in the night, with what else has ended', async () => {
    const { id, endsAt } = await asked(owner)
    expect(Math.round((Date.parse(endsAt) - Date.now()) / 86_400_000)).toBe(7)
    await server.sql`update exports set ends_at = now() - interval '1 second' where id = ${id}`
    expect((await state(owner, id)).status).toBe(404)
    await server.sql`insert into sessions (id, user_id, expires_at) values (repeat('a', 64), ${owner.id}, now() - interval '1 day')`
    await server.sql`insert into rate_buckets values ('old', 1, true, now() - interval '2 days'), ('new', 1, true, now())`
    await server.sql`insert into idempotency_keys (user_id, key, request_hash, answer, created_at)
      values (${owner.id}, 'old-key-1', 'x', '{}', now() - interval '8 days')`
    await server.sql`select graphile_worker.add_job('expired.clean')`
    await runJobs(server.url)
    const [left] = await server.sql`select
      (select count(*)::int from exports where id = ${id}) as exports,
      (select count(*)::int from sessions where id = repeat('a', 64)) as ended,
      (select count(*)::int from sessions where user_id = ${owner.id}) as live,
      (select count(*)::int from idempotency_keys where key = 'old-key-1') as keys,
      (select array_agg(name) from rate_buckets) as buckets`
    expect(left).toEqual({ exports: 0, ended: 0, live: 1, keys: 0, buckets: ['new'] })
  })
})

describe('thumbnails', () => {
  it('a save has both themes drawn in the background, and the route serves what is kept', async () => {
    const body = { base: 1, document: sceneOf('v2-45-1600', { angleDeg: 90 }) }
    await call('POST', `/api/v1/scenes/${sceneId}/versions`, { ...owner, body })
    const kept = () => server.sql`
      select theme, sha256(png) as hash from pictures where scene_id = ${sceneId} and version = 2 order by theme`
    expect(await kept()).toEqual([])
    await runJobs(server.url)
    expect(await kept()).toMatchObject([{ theme: 'light' }, { theme: 'dark' }])
    await server.sql`update pictures set png = 'kept'::bytea where scene_id = ${sceneId} and theme = 'dark' and version = 2`
    const shown = await fetchRoute(
      'GET',
      `/api/v1/scenes/${sceneId}/thumbnail.png?version=2&theme=dark`,
      owner,
    )
    expect(await shown.text()).toBe('kept')
  })

  it('one that is not there yet is drawn at once and kept', async () => {
    const made = await call('POST', '/api/v1/scenes', { ...owner, body: { document: sceneOf('single-450') } })
    const { scene } = made.body as OpenedScene
    expect((await fetchRoute('GET', scene.thumbnailUrl, owner)).headers.get('content-type')).toBe('image/png')
    const rows = await server.sql`select theme from pictures where scene_id = ${scene.id}`
    expect(rows).toEqual([{ theme: 'light' }])
  })
})
