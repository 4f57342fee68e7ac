import { write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import { shareLinks } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { hashPassword } from '@/lib/auth/passwords'
import { hashToken, newToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import type { createShareLink as contract, ShareLink } from '@/lib/contracts/share-links'
import type { BodyOf } from '@/lib/contracts/operation'
import { notFound } from '@/lib/errors/problem'
import { audit } from './audit'
import { linkEnd } from './link-end'
import { shareLinkAnswer } from './share-link-answer'

/** The address is known to whoever made it and is told once: only its hash is kept. */
export async function createShareLink(
  person: Person | null,
  sceneId: string,
  { endsAt, password = null, ...given }: Partial<BodyOf<typeof contract>>,
): Promise<{ link: ShareLink; url: string }> {
  const options = { label: '', kind: 'look' as const, version: null, frameOrigins: [], ...given }
  const token = newToken()
  const passwordHash = password === null ? null : await hashPassword(password)
  const now = new Date()
  const link = await write(async (tx) => {
    const scene = await sceneById(tx, sceneId)
    authorise(person, 'link.create', scene)
    const { version } = options
    if (version !== null && !(await versionOf(tx, sceneId, version))) throw notFound('version')
    const ends = linkEnd(person, scene, endsAt, now)
    const [row] = await tx
      .insert(shareLinks)
      .values({
        ...options,
        ...{ sceneId, passwordHash, endsAt: ends, tokenHash: hashToken(token), createdBy: person.id },
      })
      .returning()
    await audit(tx, {
      actorId: person.id,
      workshopId: scene?.workshopId ?? null,
      operation: 'link.create',
      subject: `link:${row.id}`,
      after: { scene: sceneId, ...options, endsAt: ends, locked: passwordHash !== null },
    })
    return shareLinkAnswer({ link: row, createdBy: person.name, questions: 0 }, now)
  })
  return { link, url: `${config().origin}/s/${token}` }
}
