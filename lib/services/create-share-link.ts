import { write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import { shareLinks } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { hashToken, newToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import type { ShareLink } from '@/lib/contracts/share-links'
import { notFound, refused } from '@/lib/errors/problem'
import { audit } from './audit'
import { shareLinkAnswer } from './share-link-answer'

interface NewLink {
  label: string
  version: number | null
  endsAt: string | null
}

/** The address is known to whoever made it and is told once: only its hash is kept. */
export async function createShareLink(
  person: Person | null,
  sceneId: string,
  { label, version, endsAt }: NewLink,
): Promise<{ link: ShareLink; url: string }> {
  const token = newToken()
  const now = new Date()
  const ends = endsAt === null ? null : new Date(endsAt)
  if (ends && ends <= now) {
    const message = 'This time has passed already.'
    throw refused([{ path: 'endsAt', code: 'past', message, fix: 'Give a later one, or none.' }])
  }
  const link = await write(async (tx) => {
    const scene = await sceneById(tx, sceneId)
    authorise(person, 'link.create', scene)
    if (version !== null && !(await versionOf(tx, sceneId, version))) throw notFound('version')
    const [row] = await tx
      .insert(shareLinks)
      .values({ sceneId, tokenHash: hashToken(token), label, version, endsAt: ends, createdBy: person.id })
      .returning()
    await audit(tx, {
      actorId: person.id,
      workshopId: scene?.workshopId ?? null,
      operation: 'link.create',
      subject: `link:${row.id}`,
      after: { scene: sceneId, label, version, endsAt },
    })
    return shareLinkAnswer({ link: row, createdBy: person.name }, now)
  })
  return { link, url: `${config().origin}/s/${token}` }
}
