import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { forgetShared, takeShared } from '@/lib/auth/shared-buckets'
import { forgetAllTokens } from '@/lib/auth/rate-limit'
import { call } from './support/call'
import { newOwner } from './support/people'
import { useServer } from './support/server'

const server = useServer({ RATE_LIMIT: 'on' })
const limit = { burst: 10, perMinute: 1 }
const at = (seconds: number) => new Date(1_700_000_000_000 + seconds * 1000)

describe('takeShared()', () => {
  it('takeShared() twenty at once from ten tokens gives ten', async () => {
    const name = randomUUID()
    const takes = await Promise.all(Array.from({ length: 20 }, () => takeShared(name, limit, at(0))))
    expect(takes.filter(({ taken }) => taken)).toHaveLength(10)
  })

  it('takeShared() gains by the minute, no further than the burst, and says how far it is from one', async () => {
    const name = randomUUID()
    const take = (seconds: number) => takeShared(name, limit, at(seconds))
    for (let left = 9; left >= 0; left--) expect(await take(0)).toEqual({ taken: true, tokens: left })
    expect(await take(0)).toEqual({ taken: false, tokens: 0 })
    expect(await take(45)).toEqual({ taken: false, tokens: 0.75 })
    expect(await take(60)).toEqual({ taken: true, tokens: 0 })
    expect(await take(1e6)).toEqual({ taken: true, tokens: 9 })
    await forgetShared(name)
    expect(await take(1e6)).toEqual({ taken: true, tokens: 9 })
  })

  it('tries to sign in are counted over servers: what one has counted, another that begins anew goes on with', async () => {
    const { email } = await newOwner()
    const attempt = async () => {
      // what a server keeps for itself is gone with it
      forgetAllTokens()
      const body = { email, password: 'not the password' }
      return (await call('POST', '/api/v1/auth/sign-in', { body })).status
    }
    const statuses = []
    for (let n = 0; n < 12; n++) statuses.push(await attempt())
    expect(statuses).toEqual([...Array(10).fill(401), 429, 429])
    const rows = await server.sql`select relpersistence from pg_class where relname = 'rate_buckets'`
    expect(rows).toEqual([{ relpersistence: 'u' }])
  })
})
