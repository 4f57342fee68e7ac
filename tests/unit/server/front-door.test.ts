import { beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { forgetAllTokens, takeToken } from '@/lib/auth/rate-limit'
import { readConfig } from '@/lib/config'
import { Problem } from '@/lib/errors/problem'
import { clientAddress } from '@/lib/http/client-address'
import { requireSameOrigin } from '@/lib/http/same-origin'

const url = 'postgres://app@127.0.0.1/none'

beforeAll(() => {
  process.env.DATABASE_URL = url
  process.env.COUNTERTHROW_PROXIES = '2'
  process.env.COUNTERTHROW_ORIGIN = 'https://counterthrow.example'
})

const request = (headers: Record<string, string>) =>
  new Request('https://counterthrow.example/api/v1/x', { method: 'POST', headers })

describe('readConfig()', () => {
  it('readConfig() turns limits off on this machine alone', () => {
    const limits = (more: object) => readConfig({ DATABASE_URL: url, RATE_LIMIT: 'off', ...more }).rateLimits
    expect(limits({})).toBe(false)
    expect(limits({ COUNTERTHROW_ORIGIN: 'http://localhost:4000' })).toBe(false)
    expect(limits({ COUNTERTHROW_ORIGIN: 'https://counterthrow.example' })).toBe(true)
    expect(limits({ COUNTERTHROW_PROXIES: '1' })).toBe(true)
    expect(limits({ RATE_LIMIT: 'on' })).toBe(true)
  })

  it('readConfig() takes the port into the address where none is given', () => {
    expect(readConfig({ DATABASE_URL: url, PORT: '4100', COUNTERTHROW_ORIGIN: '' }).origin).toBe(
      'http://127.0.0.1:4100',
    )
  })

  it('readConfig() says which setting cannot be used', () => {
    expect(() => readConfig({})).toThrow('DATABASE_URL')
    expect(() => readConfig({ DATABASE_URL: url, RATE_LIMIT: 'sometimes' })).toThrow('RATE_LIMIT')
    expect(() => readConfig({ DATABASE_URL: url, COUNTERTHROW_ORIGIN: 'ftp://x' })).toThrow(
      'COUNTERTHROW_ORIGIN',
    )
  })
})

describe('requireSameOrigin()', () => {
  const cookie = 'counterthrow_session=x'
  const passes = (headers: Record<string, string>) => {
    try {
      requireSameOrigin(request(headers))
      return true
    } catch (error) {
      expect(error).toMatchObject({ kind: 'foreign-origin', status: 403 })
      return false
    }
  }

  it('requireSameOrigin() believes the browser first', () => {
    expect(passes({ cookie, 'sec-fetch-site': 'same-origin' })).toBe(true)
    expect(passes({ cookie, 'sec-fetch-site': 'same-site', origin: 'https://counterthrow.example' })).toBe(
      false,
    )
    expect(passes({ cookie, 'sec-fetch-site': 'none' })).toBe(false)
  })

  it('requireSameOrigin() wants the exact Origin of a browser that says nothing', () => {
    expect(passes({ cookie, origin: 'https://counterthrow.example' })).toBe(true)
    expect(passes({ cookie, host: 'inner.example', origin: 'https://inner.example' })).toBe(true)
    for (const origin of [
      'http://counterthrow.example',
      'https://counterthrow.example.evil.example',
      'https://counterthrow.example:444',
      'null',
    ]) {
      expect([origin, passes({ cookie, origin })]).toEqual([origin, false])
    }
    expect(passes({ cookie })).toBe(false)
  })

  it('requireSameOrigin() lets through what carries no cookies', () => {
    expect(passes({ origin: 'https://evil.example' })).toBe(true)
  })
})

describe('clientAddress()', () => {
  it('clientAddress() takes what the outermost trusted proxy saw, not what a visitor says', () => {
    const seen = (forwarded: string) => clientAddress(request({ 'x-forwarded-for': forwarded }))
    expect(seen('198.51.100.1, 10.0.0.1')).toBe('198.51.100.1')
    expect(seen('made.up, 198.51.100.1, 10.0.0.1')).toBe('198.51.100.1')
    expect(seen('10.0.0.1')).toBe('unknown')
    expect(clientAddress(request({}))).toBe('unknown')
  })
})

describe('takeToken()', () => {
  beforeEach(forgetAllTokens)
  const start = 1_700_000_000_000
  const take = async (seconds: number, key = 'a') => {
    try {
      await takeToken('sign-up', key, start + seconds * 1000)
      return 'taken'
    } catch (error) {
      return (error as Problem).retryAfterSeconds
    }
  }

  const many = (times: number, seconds: number) =>
    Promise.all(Array.from({ length: times }, () => take(seconds)))

  it('takeToken() allows a burst, then one a minute, and says how long to wait', async () => {
    expect(await many(10, 0)).toEqual(Array(10).fill('taken'))
    expect(await take(0)).toBe(60)
    expect(await take(45)).toBe(15)
    expect(await take(60)).toBe('taken')
    expect(await take(60)).toBe(60)
  })

  it('takeToken() keeps those who ask too often out no longer for asking', async () => {
    await many(10, 0)
    await many(50, 1)
    expect(await take(60)).toBe('taken')
  })

  it('takeToken() counts each key by itself and fills up no further than the burst', async () => {
    await many(10, 0)
    expect(await take(0, 'b')).toBe('taken')
    expect(await many(11, 1e6)).toEqual([...Array(10).fill('taken'), 60])
  })
})
