import { lt, sql } from 'drizzle-orm'
import { write } from '@/db/client'
import { exportFiles, idempotencyKeys, passwordResetTokens, rateBuckets, sessions } from '@/db/schema'
import { forgetMails } from './mail/forget-mails'
import { requeueLeft } from './mail/requeue-left'

const daysAgo = (days: number) => sql`now() - make_interval(days => ${days}::integer)`

/** Removes what has ended and what nobody asks for any more; every night. */
export async function cleanExpired(): Promise<void> {
  await write(async (tx) => {
    await tx.delete(sessions).where(lt(sessions.expiresAt, sql`now()`))
    await tx.delete(passwordResetTokens).where(lt(passwordResetTokens.expiresAt, daysAgo(1)))
    await tx.delete(idempotencyKeys).where(lt(idempotencyKeys.createdAt, daysAgo(7)))
    await tx.delete(exportFiles).where(lt(exportFiles.endsAt, sql`now()`))
    await tx.delete(rateBuckets).where(lt(rateBuckets.at, daysAgo(1)))
  })
  await forgetMails()
  await requeueLeft()
}
