import { and, eq, gt, isNull } from 'drizzle-orm'
import { write } from '@/db/client'
import { passwordResetTokens, sessions, users } from '@/db/schema'
import { hashPassword } from '@/lib/auth/passwords'
import { hashToken } from '@/lib/auth/tokens'
import { Problem } from '@/lib/errors/problem'
import { audit } from './audit'

/** Sets the password of whoever was sent this token, once, and ends all their sessions. */
export async function resetPassword(token: string, password: string): Promise<void> {
  const passwordHash = await hashPassword(password)
  await write(async (tx) => {
    const now = new Date()
    // of two at once, the second finds it used
    const [used] = await tx
      .update(passwordResetTokens)
      .set({ usedAt: now })
      .where(
        and(
          eq(passwordResetTokens.tokenHash, hashToken(token)),
          isNull(passwordResetTokens.usedAt),
          gt(passwordResetTokens.expiresAt, now),
        ),
      )
      .returning()
    if (!used) throw new Problem('not-found', 'This link is used, ended or unknown.', 'Ask for a new one.')
    await tx.update(users).set({ passwordHash }).where(eq(users.id, used.userId))
    await tx.delete(sessions).where(eq(sessions.userId, used.userId))
    await tx
      .update(passwordResetTokens)
      .set({ usedAt: now })
      .where(and(eq(passwordResetTokens.userId, used.userId), isNull(passwordResetTokens.usedAt)))
    await audit(tx, {
      actorId: used.userId,
      workshopId: null,
      operation: 'password.reset',
      subject: `person:${used.userId}`,
    })
  })
}
