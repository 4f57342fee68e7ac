import { beforeAll, describe, expect, it } from 'vitest'
import type { OpenedScene, SaveConflict } from '@/lib/contracts/scenes'
import { versionChangesSchema } from '@/lib/contracts/versions'
import type { Scene } from '@/scene/model/scene'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

const drawn = sceneOf('v8x-5000')
const but = (change: Partial<Scene['train']>, view: Partial<Scene['view']> = {}): Scene => ({
  ...drawn,
  train: { ...drawn.train, ...change },
  view: { ...drawn.view, ...view },
})
const radius = (counterweightRadiusMm: number) =>
  but({ shape: { ...drawn.train.shape, counterweightRadiusMm } })

let owner: Someone
beforeAll(async () => {
  owner = await newOwner()
})

/** A scene with these versions, in turn. */
async function saved(...documents: Scene[]): Promise<string> {
  const { cookie } = owner
  const made = await call('POST', '/api/v1/scenes', { cookie, body: { document: documents[0] } })
  const { id } = (made.body as OpenedScene).scene
  for (const [index, document] of documents.slice(1).entries()) {
    const body = { base: index + 1, message: `Version ${index + 2}`, document }
    expect((await call('POST', `/api/v1/scenes/${id}/versions`, { cookie, body })).status).toBe(201)
  }
  return id
}

const changes = async (id: string, query: string) => {
  const answer = await call('GET', `/api/v1/scenes/${id}/changes?${query}`, { cookie: owner.cookie })
  expect(answer.status, JSON.stringify(answer.body)).toBe(200)
  const found = versionChangesSchema.parse(answer.body)
  expect(found).toEqual(answer.body)
  return found
}

const restore = (id: string, number: number, body: object, more: object = {}) =>
  call('POST', `/api/v1/scenes/${id}/versions/${number}/restore`, { cookie: owner.cookie, body, ...more })

const versions = async (id: string) => {
  const { body } = await call('GET', `/api/v1/scenes/${id}/versions`, { cookie: owner.cookie })
  return (body as { versions: { number: number; message: string; parent: number | null }[] }).versions
}

describe('GET /scenes/{id}/changes', () => {
  it('GET /scenes/{id}/changes tells parameters with unit, effects with their limit, and changes of the view apart', async () => {
    const newer = radius(90.5)
    const id = await saved(drawn, { ...newer, view: { ...newer.view, angleDeg: 270 } })
    const found = await changes(id, 'from=1&to=2')
    expect(found.from.number).toBe(1)
    expect(found.to).toMatchObject({ number: 2, parent: 1, message: 'Version 2', author: 'Tamsin Orrelby' })
    const [change, ...others] = found.parameters
    expect(others).toEqual([])
    expect(change).toMatchObject({ name: 'Counterweight radius', unit: 'mm', belowPrecision: false })
    expect(change.was).toBeCloseTo(89.5, 9)
    expect(change.now).toBeCloseTo(90.5, 9)
    const gap = change.effects.find(({ name }) => name === 'Skirt to counterweight')
    expect(gap).toMatchObject({ unit: 'mm', below: 1.5 })
    expect(gap?.was).toBeCloseTo(2.4, 6)
    expect(found.view.map(({ name }) => name)).toEqual(['Crank angle'])
    expect(found.drawn.changed).toContain('counterweight:4D')
  })

  it('GET /scenes/{id}/changes compares any two, also backwards, and counts what is below display precision', async () => {
    const id = await saved(drawn, radius(90.5), radius(89.53))
    const back = await changes(id, 'from=2&to=1')
    expect(back.parameters[0].now).toBeCloseTo(89.5, 9)
    const small = await changes(id, 'from=1&to=3')
    expect(small.parameters.map(({ belowPrecision }) => belowPrecision)).toEqual([true])
    const inches = await changes(id, 'from=1&to=3&units=us')
    expect(inches.parameters.map(({ belowPrecision }) => belowPrecision)).toEqual([false])
    expect(await changes(id, 'from=3&to=3')).toMatchObject({ parameters: [], view: [], effects: [] })
  })

  it('GET /scenes/{id}/changes works effects out at the speed that is asked for', async () => {
    const masses = { ...drawn.train.masses, pistonPinKg: 0.2 }
    const id = await saved(drawn, but({ masses }))
    const most = async (speedRpm: number) => {
      const found = await changes(id, `from=1&to=2&speedRpm=${speedRpm}`)
      expect(found.speedRpm).toBe(speedRpm)
      const effects = found.parameters.flatMap((one) => one.effects)
      const force = effects.find(({ name }) => name === 'Force, at most')
      return Number(force?.now) * (force?.unit === 'kN' ? 1000 : 1)
    }
    expect((await most(6000)) / (await most(3000))).toBeCloseTo(4, 6)
  })

  it('GET /scenes/{id}/changes with a version that is not there is not found, and with none is refused', async () => {
    const id = await saved(drawn)
    const ask = (query: string) =>
      call('GET', `/api/v1/scenes/${id}/changes?${query}`, { cookie: owner.cookie })
    expect((await ask('from=1&to=7')).status).toBe(404)
    expect((await ask('from=1')).status).toBe(422)
    expect((await ask('from=0&to=1')).status).toBe(422)
  })
})

describe('POST /scenes/{id}/versions/{number}/restore', () => {
  it('restore makes a new version of the old document on top of the head, and changes no other', async () => {
    const id = await saved(drawn, radius(90.5), radius(91))
    const answer = await restore(id, 1, { base: 3, message: 'the gap was too small' })
    expect(answer.status).toBe(201)
    const { version } = answer.body as OpenedScene
    expect(version).toMatchObject({
      number: 4,
      parent: 3,
      message: 'Restored from version 1: the gap was too small',
    })
    expect(version.document).toEqual(drawn)
    expect((await changes(id, 'from=1&to=4')).parameters).toEqual([])
    expect((await versions(id)).map(({ number }) => number)).toEqual([4, 3, 2, 1])
  })

  it('restore leaves the person’s draft of the scene as it is', async () => {
    const { cookie } = owner
    const id = await saved(drawn, radius(90.5))
    const draft = { base: 2, document: radius(92) }
    await call('PUT', `/api/v1/scenes/${id}/draft`, { cookie, body: draft })
    expect((await restore(id, 1, { base: 1 })).status).toBe(409)
    expect((await restore(id, 1, { base: 2 })).status).toBe(201)
    const { body } = await call('GET', `/api/v1/scenes/${id}/draft`, { cookie })
    expect((body as { draft: { document: Scene } }).draft.document).toEqual(radius(92))
  })

  it('restore on top of what is not the head any more is a conflict with both, and saves nothing', async () => {
    const id = await saved(drawn, radius(90.5), radius(91))
    const answer = await restore(id, 1, { base: 2 })
    expect(answer.status).toBe(409)
    const conflict = answer.body as SaveConflict
    expect(conflict.head.number).toBe(3)
    expect(conflict.base.number).toBe(2)
    expect(conflict.yours.document).toEqual(drawn)
    expect(await versions(id)).toHaveLength(3)
  })

  it('restore sent twice under one key is done once; two at once make one version and one conflict', async () => {
    const id = await saved(drawn, radius(90.5))
    const key = { headers: { 'idempotency-key': 'restore-once-1' } }
    const [first, again] = [await restore(id, 1, { base: 2 }, key), await restore(id, 1, { base: 2 }, key)]
    expect([first.status, again.status]).toEqual([201, 201])
    expect((again.body as OpenedScene).version.number).toBe(3)
    const both = await Promise.all([restore(id, 1, { base: 3 }), restore(id, 2, { base: 3 })])
    expect(both.map(({ status }) => status).sort()).toEqual([201, 409])
    expect(await versions(id)).toHaveLength(4)
  })

  it('restore of what is not there is not found; who may only read may not; it is in the audit log', async () => {
    const id = await saved(drawn, radius(90.5))
    expect((await restore(id, 9, { base: 2 })).status).toBe(404)
    const reviewer = await newMember(server.sql, owner.workshopId, 'reviewer')
    const asReviewer = { cookie: reviewer.cookie, body: { base: 2 } }
    expect((await call('POST', `/api/v1/scenes/${id}/versions/1/restore`, asReviewer)).status).toBe(403)
    await restore(id, 1, { base: 2, message: 'back' })
    const rows = await server.sql`
      select after from audit_log where subject = ${`scene:${id}`} and operation = 'scene.save'
      order by created_at desc limit 1`
    expect(rows[0].after).toMatchObject({ version: 3, message: 'Restored from version 1: back' })
  })
})
