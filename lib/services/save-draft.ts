import { write } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { upsertDraft } from './drafts'
import { readDraftDocument } from './scene-document'

/** Keeps work not yet saved, in place of what was kept before. Drafts are one's own: they leave no audit row. */
export async function saveDraft(
  person: Person,
  sceneId: string | null,
  draft: { base: number | null; document: unknown },
): Promise<{ updatedAt: string }> {
  const document = readDraftDocument(draft.document)
  const updatedAt = await write(async (tx) => {
    if (sceneId !== null) authorise(person, 'draft.keep', await sceneById(tx, sceneId))
    return upsertDraft(tx, person.id, sceneId, { base: draft.base, document })
  })
  return { updatedAt: updatedAt.toISOString() }
}
