import { eq, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { rateBuckets } from '@/db/schema'

interface Limit {
  burst: number
  perMinute: number
}

/** Takes a token of a bucket that all servers share. Answers how many are left, or how far from one it is (below 1). */
export async function takeShared(
  name: string,
  { burst, perMinute }: Limit,
  now: Date,
): Promise<{ taken: boolean; tokens: number }> {
  const at = sql`${now.toISOString()}::timestamptz`
  const [row] = await write((tx) =>
    tx.execute<{ taken: boolean; tokens: number }>(sql`
      insert into rate_buckets as bucket (name, tokens, taken, at)
      values (${name}, ${burst}::float8 - 1, true, ${at})
      on conflict (name) do update set (tokens, taken, at) = (
        select filled - (filled >= 1)::int, filled >= 1, greatest(bucket.at, excluded.at)
        from (select least(${burst}::float8, bucket.tokens
          + greatest(0, extract(epoch from excluded.at - bucket.at)) / 60 * ${perMinute}::float8) as filled) as now)
      returning taken, tokens`),
  )
  return row
}

export const forgetShared = (name: string) =>
  write((tx) => tx.delete(rateBuckets).where(eq(rateBuckets.name, name)))
