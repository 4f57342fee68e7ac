import { read } from '@/db/client'
import { liveLinkBy } from '@/db/queries/share-links'
import { newLinkPass, passSeconds } from '@/lib/auth/link-pass'
import { verifyPassword } from '@/lib/auth/passwords'
import { forgetTokens, takeToken } from '@/lib/auth/rate-limit'
import { hashToken } from '@/lib/auth/tokens'
import { linkUnavailable, Problem } from '@/lib/errors/problem'

/** Takes the password of a link and gives what proves it from then on. Tries are counted, by address and by link. */
export async function passLink(
  token: string,
  password: string,
  address: string,
): Promise<{ pass: string | null; seconds: number }> {
  const link = await read((tx) => liveLinkBy(tx, hashToken(token)))
  if (!link) throw linkUnavailable()
  const { id, passwordHash } = link
  if (passwordHash === null) return { pass: null, seconds: passSeconds }
  const one = `${id} ${address}`
  await takeToken('link-password', one)
  await takeToken('link-password-all', id)
  if (!(await verifyPassword(passwordHash, password))) {
    throw new Problem('password-wanted', 'This is not the password.', 'Ask the person who sent the link.')
  }
  await forgetTokens('link-password', one)
  return { pass: newLinkPass({ id, passwordHash }, new Date()), seconds: passSeconds }
}
