import { beforeAll, describe, expect, it } from 'vitest'
import { access, operations, roles, type Operation } from '@/lib/auth/access'
import { allOperations } from '@/lib/contracts'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { call, type Asked } from './support/call'
import { sceneOf } from './support/documents'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

interface Ground {
  workshopId: string
  sceneId: string
  linkId: string
}

type Try = (ground: Ground) => { method: string; path: string; body?: unknown }

const document = sceneOf('single-450')

/** How each operation is asked for over HTTP; one operation may be several calls. */
const tries: Record<Operation, Try[]> = {
  'scene.list': [({ workshopId }) => ({ method: 'GET', path: `scenes?workshop=${workshopId}` })],
  'scene.read': [
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/versions` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/versions/1` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/versions/1/design-sheet.pdf` }),
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/thumbnail.png` }),
  ],
  'scene.create': [
    ({ workshopId }) => ({ method: 'POST', path: 'scenes', body: { workshop: workshopId, document } }),
  ],
  'scene.save': [
    ({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/versions`, body: { base: 1, document } }),
  ],
  'scene.rename': [
    ({ sceneId }) => ({ method: 'PATCH', path: `scenes/${sceneId}`, body: { title: 'Other' } }),
  ],
  'scene.duplicate': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/duplicate`, body: {} })],
  'scene.archive': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/archive` })],
  'scene.restore': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/restore` })],
  'draft.keep': [
    ({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/draft` }),
    ({ sceneId }) => ({ method: 'PUT', path: `scenes/${sceneId}/draft`, body: { base: 1, document } }),
    ({ sceneId }) => ({ method: 'DELETE', path: `scenes/${sceneId}/draft` }),
  ],
  'link.list': [({ sceneId }) => ({ method: 'GET', path: `scenes/${sceneId}/share-links` })],
  'link.create': [({ sceneId }) => ({ method: 'POST', path: `scenes/${sceneId}/share-links`, body: {} })],
  'link.revoke': [({ linkId }) => ({ method: 'DELETE', path: `share-links/${linkId}` })],
}

async function newGround(owner: Someone): Promise<Ground> {
  const { cookie, workshopId } = owner
  const created = await call('POST', '/api/v1/scenes', { cookie, body: { document } })
  const { scene } = created.body as OpenedScene
  const made = await call('POST', `/api/v1/scenes/${scene.id}/share-links`, { cookie, body: {} })
  return { workshopId, sceneId: scene.id, linkId: (made.body as { link: { id: string } }).link.id }
}

async function attempt(ground: Ground, one: Try, asked: Asked) {
  const { method, path, body } = one(ground)
  return (await call(method, `/api/v1/${path}`, { ...asked, body })).status
}

let owner: Someone
let stranger: Someone
beforeAll(async () => {
  owner = await newOwner()
  stranger = await newOwner('Owner of another workshop')
})

const cases = operations.flatMap((operation) =>
  tries[operation].map((one, index) => ({ operation, one, index })),
)

describe('who may do what', () => {
  it('the table has every role and the tests every operation', () => {
    expect(Object.keys(tries).sort()).toEqual([...operations].sort())
    expect(operations.length).toBeGreaterThan(10)
  })

  it('every call for a signed-in person is tried here, but those on one’s own unsaved draft', () => {
    const known = { workshopId: 'w', sceneId: '{id}', linkId: '{id}' }
    const tried = cases.map(({ one }) => {
      const { method, path } = one(known)
      return `${method} /api/v1/${path.split('?')[0].replace('versions/1', 'versions/{number}')}`
    })
    const own = ['GET /api/v1/draft', 'PUT /api/v1/draft', 'DELETE /api/v1/draft']
    const all = allOperations.filter((operation) => operation.for === 'person')
    expect([...tried, ...own].sort()).toEqual(all.map(({ method, path }) => `${method} ${path}`).sort())
  })

  describe.each(roles)('%s', (role) => {
    let member: Someone
    beforeAll(async () => {
      member = await newMember(server.sql, owner.workshopId, role)
    })

    it.each(cases)('$operation ($index) as the table says', async ({ operation, one }) => {
      const status = await attempt(await newGround(owner), one, member)
      const allowed = (access[operation] as readonly string[]).includes(role)
      if (allowed) expect(status).toBeLessThan(300)
      else expect(status).toBe(403)
    })
  })

  it.each(cases)(
    'the owner of another workshop is told that there is nothing: $operation ($index)',
    async ({ one }) => {
      expect(await attempt(await newGround(owner), one, stranger)).toBe(404)
    },
  )

  it.each(cases)('a stranger is refused: $operation ($index)', async ({ one }) => {
    const ground = await newGround(owner)
    expect(await attempt(ground, one, {})).toBe(401)
    expect(await attempt(ground, one, { cookie: 'counterthrow_session=made-up' })).toBe(401)
  })

  it('a stranger is refused the draft of nobody', async () => {
    for (const method of ['GET', 'PUT', 'DELETE']) {
      expect(
        (await call(method, '/api/v1/draft', { body: method === 'PUT' ? { document } : undefined })).status,
      ).toBe(401)
    }
  })

  it('somebody whose membership has ended is told that there is nothing', async () => {
    const member = await newMember(server.sql, owner.workshopId, 'designer')
    await server.sql`delete from memberships where user_id = ${member.id}`
    for (const { one } of cases) expect(await attempt(await newGround(owner), one, member)).toBe(404)
  })
})
