import { write } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { deleteDraft } from './drafts'

export async function dropDraft(person: Person, sceneId: string | null): Promise<void> {
  await write(async (tx) => {
    if (sceneId !== null) authorise(person, 'draft.keep', await sceneById(tx, sceneId))
    await deleteDraft(tx, person.id, sceneId)
  })
}
