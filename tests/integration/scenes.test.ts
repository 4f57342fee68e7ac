import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import {
  openedSceneSchema,
  saveConflictSchema,
  type OpenedScene,
  type SceneSummary,
} from '@/lib/contracts/scenes'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

async function newScene(someone: Someone, title = 'A twin'): Promise<OpenedScene> {
  const body = { title, document: sceneOf('v2-45-1600'), message: 'First' }
  const answer = await call('POST', '/api/v1/scenes', { cookie: someone.cookie, body })
  expect(answer.status).toBe(201)
  return openedSceneSchema.parse(answer.body)
}

const save = (someone: Someone, id: string, base: number, message: string, headers = {}, angleDeg = 10) =>
  call('POST', `/api/v1/scenes/${id}/versions`, {
    cookie: someone.cookie,
    headers,
    body: { base, message, document: sceneOf('v2-45-1600', { angleDeg }) },
  })

const auditOf = (id: string) =>
  server.sql`select operation, before, after, actor_id from audit_log where subject = ${`scene:${id}`} order by id`

describe('scenes', () => {
  it('POST /scenes makes version 1 with figures recomputed from the document', async () => {
    const owner = await newOwner()
    const { scene, version, may } = await newScene(owner)
    expect(scene).toMatchObject({ title: 'A twin', headVersion: 1, cylinderCount: 2, archived: false })
    expect(scene.displacementCc).toBeCloseTo(1600, -2)
    expect(version).toMatchObject({ number: 1, parent: null, message: 'First', author: 'Tamsin Orrelby' })
    expect(version.document).toEqual(sceneOf('v2-45-1600'))
    expect(may).toContain('scene.save')
    expect(await auditOf(scene.id)).toMatchObject([{ operation: 'scene.create', actor_id: owner.id }])
  })

  it('POST /scenes/{id}/versions saves on top of the head, with parent, message and audit row', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const answer = await save(owner, scene.id, 1, 'Turned')
    expect(answer.status).toBe(201)
    const saved = openedSceneSchema.parse(answer.body)
    expect(saved.version).toMatchObject({ number: 2, parent: 1, message: 'Turned' })
    expect(saved.version.document.view.angleDeg).toBe(10)
    const first = await call('GET', `/api/v1/scenes/${scene.id}?version=1`, owner)
    expect(openedSceneSchema.parse(first.body).version.document.view.angleDeg).toBe(0)
    expect(await auditOf(scene.id)).toMatchObject([
      { operation: 'scene.create' },
      { operation: 'scene.save', before: { version: 1 }, after: { version: 2, message: 'Turned' } },
    ])
  })

  it('POST /scenes/{id}/versions on an older base is answered 409 with head, base and yours, which is kept as a draft', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    await save(owner, scene.id, 1, 'Theirs', {}, 20)
    const answer = await save(owner, scene.id, 1, 'Mine', {}, 30)
    expect(answer.status).toBe(409)
    expect(answer.headers.get('content-type')).toBe('application/problem+json')
    const { head, base, yours } = saveConflictSchema.parse(answer.body)
    expect(head).toMatchObject({ number: 2, message: 'Theirs', document: { view: { angleDeg: 20 } } })
    expect(base).toMatchObject({ number: 1, document: { view: { angleDeg: 0 } } })
    expect(yours).toMatchObject({ base: 1, message: 'Mine', document: { view: { angleDeg: 30 } } })
    const draft = await call('GET', `/api/v1/scenes/${scene.id}/draft`, owner)
    expect(draft.body).toMatchObject({ draft: { base: 1, document: { view: { angleDeg: 30 } } } })
    const rows = await server.sql`select number from scene_versions where scene_id = ${scene.id}`
    expect(rows).toHaveLength(2)
  })

  it('POST /scenes/{id}/versions by six at once from one base saves one and refuses five', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const answers = await Promise.all(
      Array.from({ length: 6 }, (_, index) => save(owner, scene.id, 1, `Try ${index}`)),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409, 409, 409, 409])
  })

  it('POST /scenes/{id}/versions from a base that is not there yet is refused by name of the field', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const answer = await save(owner, scene.id, 9, '')
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ issues: [{ path: 'base' }] })
  })

  it('POST /scenes/{id}/versions twice under one Idempotency-Key saves once, also at the same moment', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const headers = { 'idempotency-key': randomUUID() }
    const answers = await Promise.all([1, 2, 3].map(() => save(owner, scene.id, 1, 'Once', headers)))
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201])
    expect(answers.map(({ body }) => (body as OpenedScene).version.number)).toEqual([2, 2, 2])
    const rows = await server.sql`select number from scene_versions where scene_id = ${scene.id}`
    expect(rows).toHaveLength(2)
  })

  it('an Idempotency-Key used for another request is an error', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const headers = { 'idempotency-key': randomUUID() }
    expect((await save(owner, scene.id, 1, 'One', headers)).status).toBe(201)
    expect((await save(owner, scene.id, 2, 'Another', headers)).status).toBe(409)
  })

  it('one person cannot use up the Idempotency-Key of another', async () => {
    const [first, second] = [await newOwner(), await newOwner()]
    const headers = { 'idempotency-key': randomUUID() }
    const body = { document: sceneOf('v2-45-1600') }
    const answers = await Promise.all(
      [first, second].map(({ cookie }) => call('POST', '/api/v1/scenes', { cookie, headers, body })),
    )
    const ids = answers.map((answer) => (answer.body as OpenedScene).scene.id)
    expect(new Set(ids).size).toBe(2)
  })

  it('PATCH /scenes/{id} renames with before and after in the audit log; the same title again leaves no row', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const rename = () =>
      call('PATCH', `/api/v1/scenes/${scene.id}`, { cookie: owner.cookie, body: { title: 'New' } })
    expect((await rename()).body).toMatchObject({ scene: { title: 'New' } })
    await rename()
    expect(await auditOf(scene.id)).toMatchObject([
      { operation: 'scene.create' },
      { operation: 'scene.rename', before: { title: 'A twin' }, after: { title: 'New' } },
    ])
  })

  it('POST /scenes/{id}/duplicate begins a scene with one version of another and remembers which', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    await save(owner, scene.id, 1, 'Second')
    const answer = await call('POST', `/api/v1/scenes/${scene.id}/duplicate`, {
      cookie: owner.cookie,
      body: { version: 1 },
    })
    expect(answer.status).toBe(201)
    const copy = openedSceneSchema.parse(answer.body)
    expect(copy.scene).toMatchObject({
      title: 'Copy of A twin',
      duplicatedFrom: { sceneId: scene.id, version: 1 },
    })
    expect(copy.version.document.view.angleDeg).toBe(0)
  })

  it('POST /scenes/{id}/archive takes a scene out of the list, /restore brings it back', async () => {
    const owner = await newOwner()
    const { scene } = await newScene(owner)
    const listed = async (state: string) => {
      const { body } = await call('GET', `/api/v1/scenes?state=${state}`, owner)
      return (body as { scenes: SceneSummary[] }).scenes.map(({ id }) => id)
    }
    expect((await call('POST', `/api/v1/scenes/${scene.id}/archive`, owner)).status).toBe(200)
    expect(await listed('current')).toEqual([])
    expect(await listed('archived')).toEqual([scene.id])
    await call('POST', `/api/v1/scenes/${scene.id}/restore`, owner)
    expect(await listed('current')).toEqual([scene.id])
    expect((await auditOf(scene.id)).map(({ operation }) => operation)).toEqual([
      'scene.create',
      'scene.archive',
      'scene.restore',
    ])
  })

  it('drafts of a scene and of unsaved work are one each, one’s own, and gone when dropped or saved', async () => {
    const [owner, other] = [await newOwner(), await newOwner()]
    const { scene } = await newScene(owner)
    for (const address of [`/api/v1/scenes/${scene.id}/draft`, '/api/v1/draft']) {
      for (const angleDeg of [1, 2]) {
        const body = { base: 1, document: sceneOf('v2-45-1600', { angleDeg }) }
        expect((await call('PUT', address, { cookie: owner.cookie, body })).status).toBe(200)
      }
      expect((await call('GET', address, owner)).body).toMatchObject({
        draft: { base: 1, document: { view: { angleDeg: 2 } } },
      })
    }
    expect((await call('GET', '/api/v1/draft', other)).body).toEqual({ draft: null })
    expect((await call('GET', `/api/v1/scenes/${scene.id}/draft`, other)).status).toBe(404)
    await call('DELETE', '/api/v1/draft', owner)
    expect((await call('GET', '/api/v1/draft', owner)).body).toEqual({ draft: null })
    await save(owner, scene.id, 1, 'Saved')
    expect((await call('GET', `/api/v1/scenes/${scene.id}/draft`, owner)).body).toEqual({ draft: null })
  })

  it('POST /scenes with a document that is none is refused with paths from the root of the request', async () => {
    const owner = await newOwner()
    const document = structuredClone(sceneOf('v2-45-1600')) as {
      train: { cylinders: { axialMm: unknown }[] }
    }
    document.train.cylinders[1].axialMm = 'left'
    const answer = await call('POST', '/api/v1/scenes', { cookie: owner.cookie, body: { document } })
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({
      status: 422,
      issues: [{ path: 'document.train.cylinders.1.axialMm' }],
    })
  })
})
