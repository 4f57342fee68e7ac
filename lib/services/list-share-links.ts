import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import { linksOfScene } from '@/db/queries/share-links'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { ShareLink } from '@/lib/contracts/share-links'
import { shareLinkAnswer } from './share-link-answer'

export async function listShareLinks(person: Person | null, sceneId: string): Promise<ShareLink[]> {
  const rows = await read(async (tx) => {
    authorise(person, 'link.list', await sceneById(tx, sceneId))
    return linksOfScene(tx, sceneId)
  })
  const now = new Date()
  return rows.map((row) => shareLinkAnswer(row, now))
}
