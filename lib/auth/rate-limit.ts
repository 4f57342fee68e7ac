import { config } from '@/lib/config'
import { Problem } from '@/lib/errors/problem'
import type { LimitName } from '@/lib/contracts/operation'

/** A bucket holds `burst` tokens and gains `perMinute`; each request takes one. */
const limits: Record<LimitName | 'sign-in-account', { burst: number; perMinute: number }> = {
  reading: { burst: 600, perMinute: 1200 },
  writing: { burst: 120, perMinute: 240 },
  analyses: { burst: 60, perMinute: 120 },
  printing: { burst: 20, perMinute: 30 },
  shared: { burst: 60, perMinute: 120 },
  'sign-in': { burst: 20, perMinute: 10 },
  'sign-in-account': { burst: 10, perMinute: 1 },
  'sign-up': { burst: 10, perMinute: 1 },
  reset: { burst: 10, perMinute: 1 },
}

export type Limited = keyof typeof limits

interface Bucket {
  tokens: number
  at: number
}

// in memory and per process; shared by every copy of this module in it
const shared = globalThis as typeof globalThis & { counterthrowBuckets?: Map<string, Bucket> }
const buckets = (shared.counterthrowBuckets ??= new Map<string, Bucket>())
const mostBuckets = 50_000

/** Takes a token or throws, and then takes none: asking too often does not put off the next. */
export function takeToken(limit: Limited, key: string, now = Date.now()): void {
  if (!config().rateLimits) return
  const { burst, perMinute } = limits[limit]
  const name = `${limit} ${key}`
  const bucket = buckets.get(name) ?? { tokens: burst, at: now }
  const tokens = Math.min(burst, bucket.tokens + ((now - bucket.at) / 60_000) * perMinute)
  if (tokens < 1) {
    const seconds = Math.ceil(((1 - tokens) / perMinute) * 60)
    throw new Problem(
      'too-many',
      'More requests than this takes.',
      `Wait ${seconds} seconds, then try again.`,
      {
        retryAfterSeconds: seconds,
      },
    )
  }
  // the latest used last, so that the first is the one to forget
  buckets.delete(name)
  buckets.set(name, { tokens: tokens - 1, at: now })
  if (buckets.size > mostBuckets) buckets.delete(buckets.keys().next().value as string)
}

/** After a success there is no reason to count the tries before it. */
export const forgetTokens = (limit: Limited, key: string) => buckets.delete(`${limit} ${key}`)

export const forgetAllTokens = () => buckets.clear()
