import { eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { linkById } from '@/db/queries/share-links'
import { shareLinks } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { hashPassword } from '@/lib/auth/passwords'
import type { BodyOf } from '@/lib/contracts/operation'
import type { changeShareLink as contract, ShareLink } from '@/lib/contracts/share-links'
import { notFound, Problem } from '@/lib/errors/problem'
import { audit } from './audit'
import { linkEnd } from './link-end'
import { linkOf } from './link-of'
import { shareLinkAnswer } from './share-link-answer'

type Options = Partial<Pick<ShareLink, 'label' | 'kind' | 'version' | 'endsAt' | 'locked' | 'frameOrigins'>>

/** At once, for whoever has the page open too: each of their requests asks anew. */
export async function changeShareLink(
  person: Person | null,
  id: string,
  { password, endsAt, ...options }: BodyOf<typeof contract>,
): Promise<ShareLink> {
  const passwordHash = typeof password === 'string' ? await hashPassword(password) : password
  const now = new Date()
  return write(async (tx) => {
    const { row, scene, person: by } = await linkOf(tx, person, 'link.change', id)
    if (row.link.revokedAt) {
      throw new Problem('conflict', 'This link has been withdrawn for good.', 'Make another one.')
    }
    const { version } = options
    if (version && !(await versionOf(tx, scene.id, version))) throw notFound('version')
    const ends = endsAt === undefined ? undefined : linkEnd(by, scene, endsAt, now)
    // drizzle leaves alone what is undefined, and takes no change without any
    await tx
      .update(shareLinks)
      .set({ ...options, passwordHash, endsAt: ends, label: options.label ?? row.link.label })
      .where(eq(shareLinks.id, id))
    const changed = await linkById(tx, id)
    if (!changed) throw notFound('link')
    const before = shareLinkAnswer(row, now)
    const after = shareLinkAnswer(changed, now)
    await audit(tx, {
      actorId: by.id,
      workshopId: scene.workshopId,
      operation: 'link.change',
      subject: `link:${id}`,
      before: optionsOf(before),
      after: { ...optionsOf(after), ...(passwordHash && { passwordSet: true }) },
    })
    return after
  })
}

const optionsOf = ({ label, kind, version, endsAt, locked, frameOrigins }: ShareLink): Options => ({
  ...{ label, kind, version, endsAt, locked, frameOrigins },
})
