import type { Transaction } from '@/db/client'
import { liveLinkBy, type LiveLink } from '@/db/queries/share-links'
import { allow, type Guest, type Operation } from '@/lib/auth/access'
import { linkPassHolds } from '@/lib/auth/link-pass'
import { hashToken } from '@/lib/auth/tokens'
import { linkUnavailable, passwordWanted, Problem } from '@/lib/errors/problem'

/** What somebody at a link's address shows: the token in it, and the proof that they gave its password, if it has one. */
export interface LinkKey {
  token: string
  pass: string | null
}

export interface OpenLink {
  guest: Guest
  workshopId: string
  /** Of the scene, as the link shows it. */
  version: number
  /** The link's row, for what is said of it on its page. */
  link: LiveLink
}

/**
 * The one guard of everything a link opens: page, frame, picture, card, notes. Refuses unknown, ended and withdrawn
 * alike, then whoever has not given the password, then what the kind of link does not let.
 */
export async function linkBehind(
  tx: Transaction,
  { token, pass }: LinkKey,
  operation: Operation = 'scene.read',
): Promise<OpenLink> {
  const link = await liveLinkBy(tx, hashToken(token))
  if (!link) throw linkUnavailable()
  const { id, passwordHash, sceneId, workshopId, kind } = link
  if (passwordHash !== null && !linkPassHolds({ id, passwordHash }, pass, new Date())) throw passwordWanted()
  const guest: Guest = { linkId: id, sceneId, kind }
  if (!allow(guest, operation, { workshopId, sceneId })) {
    throw new Problem('not-allowed', 'This link does not include this.', 'Ask the person who sent it.')
  }
  return { guest, workshopId, version: link.pinned ?? link.headVersion, link }
}
