import postgres from 'postgres'
import { describe, expect, inject, it } from 'vitest'
import { closeDatabase } from '@/db/client'
import { call } from './support/call'
import { useServer } from './support/server'

const server = useServer()
const health = () => call('GET', '/api/v1/health')

describe('GET /health', () => {
  it('GET /health is 200 when the database answers and its migrations are current', async () => {
    expect(await health()).toMatchObject({ status: 200, body: { status: 'ready' } })
  })

  it('GET /health is 503 when a migration is missing, and when one is there that we do not know', async () => {
    const keeper = postgres(server.ownerUrl, { max: 1 })
    const [last] = await keeper`select * from drizzle.__drizzle_migrations order by created_at desc limit 1`
    await keeper`delete from drizzle.__drizzle_migrations where id = ${last.id}`
    expect((await health()).status).toBe(503)
    await keeper`insert into drizzle.__drizzle_migrations (hash, created_at) values ('later', 99999999999999)`
    expect((await health()).status).toBe(503)
    await keeper`delete from drizzle.__drizzle_migrations where hash = 'later'`
    await keeper`insert into drizzle.__drizzle_migrations ${keeper(last)}`
    await keeper.end()
    expect((await health()).status).toBe(200)
  })

  it('GET /health is 503, and a problem, when the database is gone', async () => {
    await closeDatabase()
    const [{ name }] = await server.sql`select current_database() as name`
    const keeper = postgres(inject('cluster').keeperUrl, { max: 1 })
    await keeper`alter database ${keeper(name)} allow_connections false`
    const answer = await health()
    await keeper`alter database ${keeper(name)} allow_connections true`
    await keeper.end()
    expect(answer).toMatchObject({ status: 503, body: { title: 'Not ready', status: 503 } })
    expect(answer.headers.get('content-type')).toBe('application/problem+json')
    expect((await health()).status).toBe(200)
  })
})
