import { and, eq, lt, sql } from 'drizzle-orm'
import { read, write, type Transaction } from '@/db/client'
import { userByEmail } from '@/db/queries/users'
import { idempotencyKeys, sessions } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { verifyPassword } from '@/lib/auth/passwords'
import { personOfUser } from '@/lib/auth/person'
import { forgetTokens, takeToken } from '@/lib/auth/rate-limit'
import { beginSession, type NewSession } from '@/lib/auth/sessions'
import { Problem } from '@/lib/errors/problem'
import { audit } from './audit'

/** The same work, time and words whether the address is unknown or the password wrong. */
export async function signIn(
  email: string,
  password: string,
  userAgent: string,
): Promise<{ person: Person; session: NewSession }> {
  await takeToken('sign-in-account', email)
  const user = await read((tx) => userByEmail(tx, email))
  if (!(await verifyPassword(user?.passwordHash, password)) || !user) {
    throw new Problem(
      'not-signed-in',
      'Address and password do not go together.',
      'Check both, or ask for a new password.',
    )
  }
  await forgetTokens('sign-in-account', email)
  const session = await beginSession(user.id, userAgent)
  const person = await write(async (tx) => {
    await audit(tx, {
      actorId: user.id,
      workshopId: null,
      operation: 'person.sign-in',
      subject: `person:${user.id}`,
    })
    await forgetOld(tx, user.id)
    return personOfUser(tx, user)
  })
  return { person, session }
}

/** What has ended is of no use to anybody; the keys of requests are kept for as long as one may be sent again. */
async function forgetOld(tx: Transaction, userId: string): Promise<void> {
  await tx.delete(sessions).where(and(eq(sessions.userId, userId), lt(sessions.expiresAt, sql`now()`)))
  await tx
    .delete(idempotencyKeys)
    .where(
      and(eq(idempotencyKeys.userId, userId), lt(idempotencyKeys.createdAt, sql`now() - interval '7 days'`)),
    )
}
