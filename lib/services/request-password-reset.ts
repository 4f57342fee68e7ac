import { write, type Transaction } from '@/db/client'
import { userByEmail } from '@/db/queries/users'
import { passwordResetTokens } from '@/db/schema'
import { newId } from '@/db/schema/columns'
import { hashToken, newToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import { errorCode } from '@/lib/errors/as-problem'
import { audit } from './audit'
import { postMail } from './mail/post-mail'

const minutes = 60
const noSuchUser = '23503'

/** Sends a link to whoever has this address. Says and does as much, to the eye and the clock, when nobody has. */
export const requestPasswordReset = (email: string): Promise<void> =>
  write(async (tx) => {
    const found = await userByEmail(tx, email)
    if (found) await postLink(tx, { email, name: found.name, userId: found.id }, found.id)
    else await postLinkToNobody(tx, email)
    await audit(tx, {
      actorId: found?.id ?? null,
      workshopId: null,
      operation: 'password.reset-asked',
      subject: found ? `person:${found.id}` : 'person:unknown',
    })
  })

async function postLink(
  tx: Transaction,
  to: { email: string; name: string; userId: string | null },
  ownerId: string,
) {
  const token = newToken()
  const tokenHash = hashToken(token)
  await postMail(tx, {
    template: 'password-reset',
    to,
    data: { name: to.name, url: `${config().origin}/reset?token=${token}`, minutes },
    key: `password-reset:${tokenHash}`,
    workshopId: null,
  })
  const expiresAt = new Date(Date.now() + minutes * 60_000)
  await tx.insert(passwordResetTokens).values({ tokenHash, userId: ownerId, expiresAt })
}

/** The same work, of which the last step is refused by its foreign key, so that nothing of it stays. */
async function postLinkToNobody(tx: Transaction, email: string) {
  try {
    await tx.transaction((nested) => postLink(nested, { email, name: email, userId: null }, newId()))
  } catch (error) {
    if (errorCode(error) !== noSuchUser) throw error
  }
}
