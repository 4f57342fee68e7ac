import { config } from '@/lib/config'
import { Problem } from '@/lib/errors/problem'
import type { LimitName } from '@/lib/contracts/operation'
import { forgetShared, takeShared } from './shared-buckets'

/** A bucket holds `burst` tokens and gains `perMinute`; each request takes one. */
const limits: Record<
  LimitName | 'sign-in-account' | 'link-password' | 'link-password-all' | 'question',
  { burst: number; perMinute: number }
> = {
  reading: { burst: 600, perMinute: 1200 },
  writing: { burst: 120, perMinute: 240 },
  analyses: { burst: 60, perMinute: 120 },
  printing: { burst: 20, perMinute: 30 },
  shared: { burst: 60, perMinute: 120 },
  inviting: { burst: 30, perMinute: 3 },
  'guest-writing': { burst: 10, perMinute: 4 },
  'sign-in': { burst: 20, perMinute: 10 },
  'sign-in-account': { burst: 10, perMinute: 1 },
  'sign-up': { burst: 10, perMinute: 1 },
  reset: { burst: 10, perMinute: 1 },
  // of one link: by one address, and by all of them together
  'link-password': { burst: 6, perMinute: 1 },
  'link-password-all': { burst: 60, perMinute: 10 },
  question: { burst: 3, perMinute: 0.2 },
}

export type Limited = keyof typeof limits

interface Bucket {
  tokens: number
  at: number
}

/** What keeps somebody from guessing or flooding must hold over all servers together: those are counted in the database. */
const overAll: ReadonlySet<Limited> = new Set<Limited>([
  'sign-in',
  'sign-in-account',
  'link-password',
  'link-password-all',
  'guest-writing',
  'question',
])

// the others in memory and per process; shared by every copy of this module in it
const shared = globalThis as typeof globalThis & { counterthrowBuckets?: Map<string, Bucket> }
const buckets = (shared.counterthrowBuckets ??= new Map<string, Bucket>())
const mostBuckets = 50_000

/** Takes a token or throws, and then takes none: asking too often does not put off the next. */
export async function takeToken(limit: Limited, key: string, now = Date.now()): Promise<void> {
  if (!config().rateLimits) return
  const name = `${limit} ${key}`
  const take = overAll.has(limit)
    ? await takeShared(name, limits[limit], new Date(now))
    : takeHere(name, limit, now)
  if (take.taken) return
  const seconds = Math.ceil(((1 - take.tokens) / limits[limit].perMinute) * 60)
  throw new Problem(
    'too-many',
    'More requests than this takes.',
    `Wait ${seconds} seconds, then try again.`,
    {
      retryAfterSeconds: seconds,
    },
  )
}

function takeHere(name: string, limit: Limited, now: number) {
  const { burst, perMinute } = limits[limit]
  const bucket = buckets.get(name) ?? { tokens: burst, at: now }
  const tokens = Math.min(burst, bucket.tokens + ((now - bucket.at) / 60_000) * perMinute)
  if (tokens < 1) return { taken: false, tokens }
  // the latest used last, so that the first is the one to forget
  buckets.delete(name)
  buckets.set(name, { tokens: tokens - 1, at: now })
  if (buckets.size > mostBuckets) buckets.delete(buckets.keys().next().value as string)
  return { taken: true, tokens: tokens - 1 }
}

/** After a success there is no reason to count the tries before it. */
export async function forgetTokens(limit: Limited, key: string): Promise<void> {
  const name = `${limit} ${key}`
  if (!overAll.has(limit)) buckets.delete(name)
  else if (config().rateLimits) await forgetShared(name)
}

/** Of this process. */
export const forgetAllTokens = () => buckets.clear()
