import { read } from '@/db/client'
import { sceneBehindLink } from '@/db/queries/share-links'
import { hashToken } from '@/lib/auth/tokens'
import type { SharedScene } from '@/lib/contracts/share-links'
import { linkUnavailable } from '@/lib/errors/problem'
import { storedScene } from './scene-document'

/** What a live link opens, with the scene it stands for. Unknown, ended and withdrawn ones are refused alike. */
export async function lookThroughShareLink(token: string): Promise<SharedScene & { sceneId: string }> {
  const found = await read((tx) => sceneBehindLink(tx, hashToken(token)))
  if (!found) throw linkUnavailable()
  return {
    ...found,
    savedAt: found.savedAt.toISOString(),
    endsAt: found.endsAt?.toISOString() ?? null,
    document: storedScene(found.document),
  }
}

/** The same as whoever holds the link may see it. */
export async function openShareLink(token: string): Promise<SharedScene> {
  const { sceneId: _, ...shared } = await lookThroughShareLink(token)
  return shared
}
