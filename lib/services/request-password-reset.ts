import { write } from '@/db/client'
import { userByEmail } from '@/db/queries/users'
import { passwordResetTokens } from '@/db/schema'
import { mailer } from '@/lib/adapters/mail'
import { hashToken, newToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import { audit } from './audit'

const minutes = 60

/** Sends a link to whoever has this address. Says and does as much, to the eye, when nobody has. */
export async function requestPasswordReset(email: string): Promise<void> {
  const token = newToken()
  const user = await write(async (tx) => {
    const found = await userByEmail(tx, email)
    if (found) {
      await tx.insert(passwordResetTokens).values({
        tokenHash: hashToken(token),
        userId: found.id,
        expiresAt: new Date(Date.now() + minutes * 60_000),
      })
    }
    await audit(tx, {
      actorId: found?.id ?? null,
      workshopId: null,
      operation: 'password.reset-asked',
      subject: found ? `person:${found.id}` : 'person:unknown',
    })
    return found
  })
  if (!user) return
  await mailer().send({
    to: user.email,
    subject: 'A new password for Counterthrow',
    text: [
      `${user.name},`,
      '',
      'somebody, most likely you, asked for a new password. Set it here:',
      '',
      `${config().origin}/reset?token=${token}`,
      '',
      `The link works once, within ${minutes} minutes. If it was not you, leave it: nothing has changed.`,
    ].join('\n'),
  })
}
