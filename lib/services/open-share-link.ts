import { read, type Transaction } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import type { SharedScene } from '@/lib/contracts/shared'
import { linkUnavailable } from '@/lib/errors/problem'
import { linkBehind, type LinkKey } from './link-behind'
import { approvalOf } from './reviews/approval-of'
import { storedScene } from './scene-document'

/** What a live link opens, with the scene it stands for. */
export async function lookThroughShareLink(key: LinkKey): Promise<SharedScene & { sceneId: string }> {
  return read(async (tx) => {
    const { guest, version, link } = await linkBehind(tx, key)
    const shown = await versionOf(tx, guest.sceneId, version)
    if (!shown) throw linkUnavailable()
    return {
      sceneId: guest.sceneId,
      title: link.title,
      workshop: link.workshop,
      kind: guest.kind,
      version,
      versions: link.headVersion,
      savedAt: shown.createdAt.toISOString(),
      approved: await stampOf(tx, guest.sceneId, version),
      endsAt: link.endsAt?.toISOString() ?? null,
      openingsKeptDays: link.openingsKeptDays,
      framable: link.frameOrigins.length > 0,
      locked: link.passwordHash !== null,
      document: storedScene(shown.document),
    }
  })
}

/** Without the name of who gave it: a link tells nobody of the workshop's people. */
async function stampOf(tx: Transaction, sceneId: string, version: number): Promise<SharedScene['approved']> {
  const approval = await approvalOf(tx, sceneId, version)
  return approval && { word: approval.word, at: approval.at.toISOString() }
}

/** The same as whoever holds the link may see it. */
export async function openShareLink(key: LinkKey): Promise<SharedScene> {
  const { sceneId: _, ...shared } = await lookThroughShareLink(key)
  return shared
}
