import { and, eq, isNull, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { apiTokens } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { notFound } from '@/lib/errors/problem'
import { audit } from './audit'

/** From now on it opens nothing, for good. Revoking it again changes nothing. */
export async function revokeApiToken(person: Person, id: string): Promise<void> {
  await write(async (tx) => {
    const own = and(eq(apiTokens.id, id), eq(apiTokens.userId, person.id))
    const [revoked] = await tx
      .update(apiTokens)
      .set({ revokedAt: sql`now()` })
      .where(and(own, isNull(apiTokens.revokedAt)))
      .returning()
    if (revoked) {
      await audit(tx, {
        actorId: person.id,
        workshopId: revoked.workshopId,
        operation: 'token.revoke',
        subject: `token:${id}`,
        before: { name: revoked.name },
      })
    } else if ((await tx.$count(apiTokens, own)) === 0) throw notFound('token')
  })
}
