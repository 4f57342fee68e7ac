import { createHmac, timingSafeEqual } from 'node:crypto'

/** For how long a link's password need not be given again. */
export const passSeconds = 12 * 60 * 60

interface Locked {
  id: string
  passwordHash: string
}

/** The salted hash of the password is a secret of ours: with another password every pass is void. */
const sealOf = ({ id, passwordHash }: Locked, until: string) =>
  createHmac('sha256', passwordHash).update(`${id} ${until}`).digest('base64url')

/** What somebody holds who has given the password of a link: until when, sealed. Nothing of it is kept here. */
export function newLinkPass(link: Locked, now: Date): string {
  const until = String(Math.floor(now.getTime() / 1000) + passSeconds)
  return `${until}.${sealOf(link, until)}`
}

export function linkPassHolds(link: Locked, pass: string | null, now: Date): boolean {
  const [, until, seal] = /^(\d{1,12})\.([\w-]{43})$/.exec(pass ?? '') ?? []
  if (!until || Number(until) * 1000 <= now.getTime()) return false
  return timingSafeEqual(Buffer.from(seal), Buffer.from(sealOf(link, until)))
}
