import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { isWithin, roles, type Role } from '@/lib/auth/access'
import { allOperations } from '@/lib/contracts'
import type { ApiToken } from '@/lib/contracts/tokens'
import { call, type Asked } from './support/call'
import { sceneOf } from './support/documents'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

const make = (who: Someone, body: object = {}, workshop = who.workshopId) =>
  call('POST', `/api/v1/workshops/${workshop}/tokens`, {
    cookie: who.cookie,
    body: { name: 'Nightly export', ...body },
  })

async function newToken(who: Someone, body: object = {}) {
  const answer = await make(who, body)
  expect(answer.status).toBe(201)
  return answer.body as { token: ApiToken; secret: string }
}

const bearer = (secret: string, asked: Asked = {}): Asked => ({
  ...asked,
  headers: { authorization: `Bearer ${secret}`, ...asked.headers },
})
const scenes = (secret: string, workshop?: string) =>
  call('GET', workshop ? `/api/v1/scenes?workshop=${workshop}` : '/api/v1/scenes', bearer(secret))
const create = (secret: string) =>
  call('POST', '/api/v1/scenes', bearer(secret, { body: { document: sceneOf('single-450') } }))
const listed = async (who: Someone) => {
  const { body } = await call('GET', '/api/v1/account/tokens', { cookie: who.cookie })
  return (body as { tokens: ApiToken[] }).tokens
}

describe('making a token', () => {
  it('tells it once and keeps its hash', async () => {
    const owner = await newOwner()
    const { token, secret } = await newToken(owner, { days: 30 })
    expect(secret).toMatch(/^counterthrow_[\w-]{32}$/)
    expect(Date.parse(token.endsAt) - Date.parse(token.createdAt)).toBeCloseTo(30 * 86_400_000, -4)
    const [row] = await server.sql`select * from api_tokens where id = ${token.id}`
    expect(row.token_hash).toBe(createHash('sha256').update(secret).digest('hex'))
    const kept = JSON.stringify([row, await listed(owner), await server.sql`select * from audit_log`])
    expect(kept).not.toContain(secret)
    expect(JSON.stringify(await listed(owner))).not.toContain(row.token_hash)
  })

  describe.each(roles)('as %s', (own) => {
    it.each(roles)('a token as %s, if everything that it may is the maker’s too', async (wanted) => {
      const owner = await newOwner()
      const member = await newMember(server.sql, owner.workshopId, own)
      const { status, body } = await make(member, { role: wanted })
      expect(status).toBe(isWithin(wanted, own) ? 201 : 422)
      if (status === 422) expect((body as { issues: { path: string }[] }).issues[0].path).toBe('role')
    })
  })

  it('is refused in another’s workshop, without a name, and for longer than a year', async () => {
    const [owner, stranger] = [await newOwner(), await newOwner()]
    expect((await make(owner, {}, stranger.workshopId)).status).toBe(404)
    expect((await make(owner, { name: ' ' })).status).toBe(422)
    expect((await make(owner, { days: 367 })).status).toBe(422)
  })

  it('fifty that work are as many as there may be', async () => {
    const owner = await newOwner()
    await server.sql`
      insert into api_tokens (id, user_id, workshop_id, name, role, token_hash, ends_at)
      select gen_random_uuid(), ${owner.id}, ${owner.workshopId}, 'T', 'owner',
        encode(sha256(gen_random_uuid()::text::bytea), 'hex'), now() + interval '1 day'
      from generate_series(1, 50)`
    expect((await make(owner)).status).toBe(409)
  })
})

describe('using a token', () => {
  it('acts as its role in its workshop, and in no other of its maker’s', async () => {
    const owner = await newOwner()
    const second = await call('POST', '/api/v1/workshops', {
      cookie: owner.cookie,
      body: { name: 'Second' },
    })
    const { secret } = await newToken(owner, { role: 'sales' })
    expect((await scenes(secret)).status).toBe(200)
    expect((await scenes(secret, (second.body as { id: string }).id)).status).toBe(404)
    expect((await create(secret)).status).toBe(403)
    const { secret: designer } = await newToken(owner, { role: 'designer' })
    const made = await create(designer)
    expect(made.status).toBe(201)
    expect((made.body as { scene: { workshopId: string } }).scene.workshopId).toBe(owner.workshopId)
  })

  it('needs no proof of origin, and beside it a cookie counts for nothing', async () => {
    const [owner, stranger] = [await newOwner(), await newOwner()]
    const { secret } = await newToken(owner, { role: 'reviewer' })
    const both = bearer(secret, { cookie: stranger.cookie, headers: { 'sec-fetch-site': 'cross-site' } })
    const who = await call('GET', '/api/v1/auth/session', both)
    expect(who.body).toMatchObject({
      person: { id: owner.id, workshop: owner.workshopId, workshops: [{ role: 'reviewer' }] },
    })
    const theirs = await call('GET', `/api/v1/workshops/${stranger.workshopId}`, both)
    expect(theirs.status).toBe(404)
    // the cookie's own session is neither used nor ended
    await call('POST', '/api/v1/auth/sign-out', both)
    const still = await call('GET', '/api/v1/auth/session', { cookie: stranger.cookie })
    expect(still.body).toMatchObject({ person: { id: stranger.id } })
    const made = await call('POST', '/api/v1/scenes', {
      ...both,
      body: { workshop: stranger.workshopId, document: sceneOf('single-450') },
    })
    expect(made.status).toBe(404)
  })

  it('unknown, ended and revoked are refused alike, also beside a good cookie', async () => {
    const owner = await newOwner()
    const ended = await newToken(owner)
    await server.sql`update api_tokens set ends_at = now() where id = ${ended.token.id}`
    const revoked = await newToken(owner)
    const revoke = await call('DELETE', `/api/v1/account/tokens/${revoked.token.id}`, {
      cookie: owner.cookie,
    })
    expect(revoke.status).toBe(204)
    const bodies = new Set<string>()
    for (const secret of [ended.secret, revoked.secret, 'counterthrow_made-up', owner.cookie.split('=')[1]]) {
      const answer = await call('GET', '/api/v1/scenes', bearer(secret, { cookie: owner.cookie }))
      expect(answer.status).toBe(401)
      expect(answer.headers.get('www-authenticate')).toBe('Bearer')
      bodies.add(JSON.stringify(answer.body))
    }
    expect(bodies.size).toBe(1)
    expect((await listed(owner)).map(({ state }) => state)).toEqual(['revoked', 'ended'])
  })

  const demotions: { from: Role; token: Role; to: Role; acts: Role | null }[] = [
    { from: 'owner', token: 'owner', to: 'designer', acts: 'designer' },
    { from: 'owner', token: 'reviewer', to: 'designer', acts: null },
    { from: 'designer', token: 'sales', to: 'owner', acts: 'sales' },
    { from: 'designer', token: 'designer', to: 'service', acts: 'service' },
    { from: 'sales', token: 'sales', to: 'service', acts: null },
  ]
  it.each(demotions)(
    'made as $token by $from who is now $to, it acts as $acts',
    async ({ from, token: role, to, acts }) => {
      const owner = await newOwner()
      const member = await newMember(server.sql, owner.workshopId, from)
      const { secret } = await newToken(member, { role })
      await call('PATCH', `/api/v1/workshops/${owner.workshopId}/people/${member.id}`, {
        cookie: owner.cookie,
        body: { role: to },
      })
      const { body } = await call('GET', '/api/v1/auth/session', bearer(secret))
      const { person } = body as { person: { workshops: { role: Role }[] } | null }
      expect(person?.workshops.map((workshop) => workshop.role) ?? null).toEqual(acts && [acts])
      expect(await listed(member)).toMatchObject([{ role, actsAs: acts }])
    },
  )

  it('ends for good when its maker is removed, even if they come back', async () => {
    const owner = await newOwner()
    const member = await newMember(server.sql, owner.workshopId, 'designer')
    const { secret, token } = await newToken(member)
    await call('DELETE', `/api/v1/workshops/${owner.workshopId}/people/${member.id}`, {
      cookie: owner.cookie,
    })
    expect((await scenes(secret)).status).toBe(401)
    await server.sql`insert into memberships (workshop_id, user_id, role)
      values (${owner.workshopId}, ${member.id}, 'designer')`
    expect((await scenes(secret)).status).toBe(401)
    expect((await listed(member)).find(({ id }) => id === token.id)?.state).toBe('revoked')
  })

  it('when it was last used is written at most once a minute', async () => {
    const owner = await newOwner()
    const { secret, token } = await newToken(owner)
    const used = async () =>
      (await server.sql`select last_used_at from api_tokens where id = ${token.id}`)[0]
        .last_used_at as Date | null
    expect(await used()).toBeNull()
    await scenes(secret)
    const first = await used()
    expect(first).not.toBeNull()
    await scenes(secret)
    expect(await used()).toEqual(first)
    await server.sql`update api_tokens set last_used_at = now() - interval '61 seconds' where id = ${token.id}`
    await scenes(secret)
    expect((await used())!.getTime()).toBeGreaterThanOrEqual(first!.getTime())
  })

  it('is revoked by its maker alone', async () => {
    const [owner, other] = [await newOwner(), await newOwner()]
    const { token, secret } = await newToken(owner)
    const revoke = (who: Someone) =>
      call('DELETE', `/api/v1/account/tokens/${token.id}`, { cookie: who.cookie })
    expect((await revoke(other)).status).toBe(404)
    expect((await scenes(secret)).status).toBe(200)
    expect((await revoke(owner)).status).toBe(204)
    expect((await revoke(owner)).status).toBe(204)
  })
})

describe('what no token does', () => {
  const atPage = allOperations.filter((operation) => operation.atPage)
  it.each(atPage.map(({ method, path }) => ({ method, path })))('$method $path', async ({ method, path }) => {
    const owner = await newOwner()
    const { secret } = await newToken(owner)
    const address = path.replace('{id}', owner.workshopId).replace('{token}', 'x')
    const answer = await call(method, address, bearer(secret, { body: method === 'GET' ? undefined : {} }))
    expect(answer).toMatchObject({ status: 403, body: { detail: 'A program cannot do this with a token.' } })
  })

  it('is everything on one’s own account', () => {
    const own = allOperations.filter(({ path }) => path.startsWith('/api/v1/account'))
    expect(own.length).toBeGreaterThan(7)
    for (const operation of own) expect(atPage, operation.id).toContain(operation)
  })
})
