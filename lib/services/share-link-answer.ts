import type { ShareLinkRow } from '@/db/queries/share-links'
import type { ShareLink } from '@/lib/contracts/share-links'

export function shareLinkAnswer({ link, createdBy, questions }: ShareLinkRow, now: Date): ShareLink {
  const ended = link.endsAt !== null && link.endsAt <= now
  return {
    id: link.id,
    sceneId: link.sceneId,
    label: link.label,
    kind: link.kind,
    version: link.version,
    state: link.revokedAt ? 'withdrawn' : ended ? 'ended' : 'live',
    endsAt: link.endsAt?.toISOString() ?? null,
    locked: link.passwordHash !== null,
    frameOrigins: link.frameOrigins,
    revokedAt: link.revokedAt?.toISOString() ?? null,
    opened: link.opened,
    lastOpenedAt: link.lastOpenedAt?.toISOString() ?? null,
    questions,
    createdBy,
    createdAt: link.createdAt.toISOString(),
  }
}
