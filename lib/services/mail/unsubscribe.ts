import { eq } from 'drizzle-orm'
import { read, write, type Transaction } from '@/db/client'
import { unsubscribeTokens } from '@/db/schema'
import { hashToken } from '@/lib/auth/tokens'
import { notFound } from '@/lib/errors/problem'
import type { MailKind } from '@/lib/letters/mail-kinds'
import { keepPreference } from './mail-preferences'

async function behindToken(tx: Transaction, token: string) {
  const [row] = await tx
    .select()
    .from(unsubscribeTokens)
    .where(eq(unsubscribeTokens.tokenHash, hashToken(token)))
  if (!row) throw notFound('address')
  return row
}

/** What the token turns off, for the page that asks before it does. Says nothing of whose it is. */
export const unsubscribeKind = (token: string): Promise<MailKind> =>
  read(async (tx) => (await behindToken(tx, token)).kind)

/** Turns off that kind of mail for whoever got the token; a second time changes nothing. */
export const unsubscribe = (token: string): Promise<MailKind> =>
  write(async (tx) => {
    const { userId, kind } = await behindToken(tx, token)
    await keepPreference(tx, userId, kind, false)
    return kind
  })
