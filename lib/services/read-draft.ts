import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import { sceneDrafts } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { DraftAnswer } from '@/lib/contracts/drafts'
import { thisDraft } from './drafts'
import { readDraftDocument } from './scene-document'

export async function readDraft(person: Person, sceneId: string | null): Promise<DraftAnswer | null> {
  const draft = await read(async (tx) => {
    if (sceneId !== null) authorise(person, 'draft.keep', await sceneById(tx, sceneId))
    const [row] = await tx.select().from(sceneDrafts).where(thisDraft(person.id, sceneId))
    return row
  })
  if (!draft) return null
  return {
    document: readDraftDocument(draft.document),
    base: draft.baseVersion,
    updatedAt: draft.updatedAt.toISOString(),
  }
}
