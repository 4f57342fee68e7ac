import { beforeAll, describe, expect, it } from 'vitest'
import { access, linkKinds, operations, type Holder } from '@/lib/auth/access'
import { call } from './support/call'
import { askBehind, behindLinks, newLink, newScene } from './support/links'
import { newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
let sceneId: string

beforeAll(async () => {
  owner = await newOwner()
  sceneId = await newScene(owner)
})

const allows = (kind: (typeof linkKinds)[number], operation: keyof typeof access) =>
  (access[operation] as readonly Holder[]).includes(`link:${kind}`)

const cases = linkKinds.flatMap((kind) => behindLinks.map((one) => ({ kind, ...one })))

describe('what a holder of a link may do', () => {
  it('every operation that the table gives to a link is tried here', () => {
    const given = operations.filter((operation) => linkKinds.some((kind) => allows(kind, operation)))
    expect([...new Set(behindLinks.map(({ operation }) => operation))].sort()).toEqual(given.sort())
  })

  it.each(cases)('a live link of kind $kind: $method $path as the table says', async ({ kind, ...one }) => {
    const { token } = await newLink(owner, sceneId, { kind })
    const { status } = await askBehind(token, one)
    if (allows(kind, one.operation)) expect(status).toBeLessThan(300)
    else expect(status).toBe(403)
  })

  it.each(cases)(
    'an ended and a withdrawn link of kind $kind: $method $path is not there',
    async ({ kind, ...one }) => {
      const ended = await newLink(owner, sceneId, { kind })
      const withdrawn = await newLink(owner, sceneId, { kind })
      await server.sql`update share_links set ends_at = now() where id = ${ended.link.id}`
      await server.sql`update share_links set revoked_at = now() where id = ${withdrawn.link.id}`
      for (const { token } of [ended, withdrawn]) expect((await askBehind(token, one)).status).toBe(404)
    },
  )

  it.each(linkKinds)('a link of kind %s opens nothing of any scene by its id', async (kind) => {
    const other = await newScene(owner, 'Another one')
    const { token } = await newLink(owner, sceneId, { kind })
    for (const id of [other, sceneId]) {
      for (const path of ['', '/versions', '/share-links', '/thumbnail.png']) {
        const headers = { 'x-link-pass': token }
        const cookie = `counterthrow_session=${token}; counterthrow_link=${token}`
        expect((await call('GET', `/api/v1/scenes/${id}${path}`, { cookie, headers })).status).toBe(401)
      }
    }
  })
})
