import { eq, sql } from 'drizzle-orm'
import { write, type Transaction } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { lockScene } from '@/db/queries/scenes'
import { scenes, sceneVersions } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { OpenedScene, SaveConflict } from '@/lib/contracts/scenes'
import { notFound, Problem, refused } from '@/lib/errors/problem'
import type { Scene } from '@/scene/model/scene'
import { audit } from './audit'
import { once, requestHash, versionPlace } from './idempotency'
import { deleteDraft, upsertDraft } from './drafts'
import { drawLater } from './pictures/draw-later'
import { openedScene, versionAnswer } from './scene-answers'
import { acceptScene, sceneFigures } from './scene-document'

interface Save {
  base: number
  message: string
  document: unknown
}

/** What becomes of the person's draft of the scene: saved with this, or left as it is since it is something else. */
type DraftFate = 'saved' | 'left'

/** The base is not the head, so nothing is saved; both stand in the answer, and yours is kept as a draft. */
class Overtaken extends Error {}

/** A new version on top of the head. Only what was made from the head may replace it. */
export async function saveVersion(
  person: Person | null,
  id: string,
  save: Save,
  key?: string,
  draft: DraftFate = 'saved',
): Promise<OpenedScene> {
  const document = acceptScene(save.document)
  try {
    return await write(async (tx) => {
      const scene = await lockScene(tx, id)
      authorise(person, 'scene.save', scene)
      const { sceneId, version } = await once(
        tx,
        person.id,
        key,
        requestHash('save', id, save),
        versionPlace,
        async () => {
          if (save.base !== scene.headVersion) throw new Overtaken()
          const number = scene.headVersion + 1
          await insertVersion(tx, person, scene, number, save.message, document)
          if (draft === 'saved') await deleteDraft(tx, person.id, scene.id)
          return { sceneId: id, version: number }
        },
      )
      return openedScene(tx, person, sceneId, version)
    })
  } catch (error) {
    if (error instanceof Overtaken && person) throw await conflict(person, id, save, document, draft)
    throw error
  }
}

async function insertVersion(
  tx: Transaction,
  person: Person,
  scene: { id: string; workshopId: string; headVersion: number },
  number: number,
  message: string,
  document: Scene,
) {
  await tx.insert(sceneVersions).values({
    sceneId: scene.id,
    number,
    parent: scene.headVersion,
    message,
    authorId: person.id,
    document,
    ...sceneFigures(document),
  })
  await tx
    .update(scenes)
    .set({ headVersion: number, updatedAt: sql`now()` })
    .where(eq(scenes.id, scene.id))
  await drawLater(tx, scene.id, number)
  await audit(tx, {
    actorId: person.id,
    workshopId: scene.workshopId,
    operation: 'scene.save',
    subject: `scene:${scene.id}`,
    before: { version: scene.headVersion },
    after: { version: number, message },
  })
}

async function conflict(
  person: Person,
  id: string,
  save: Save,
  document: Scene,
  draft: DraftFate,
): Promise<Problem> {
  const { base, message } = save
  return write(async (tx) => {
    const scene = await lockScene(tx, id)
    if (base > scene.headVersion) {
      const message = `There is no version ${base} yet: the latest is ${scene.headVersion}.`
      throw refused([
        { path: 'base', code: 'unknown-version', message, fix: 'Give the version yours was made from.' },
      ])
    }
    const [head, from] = [await versionOf(tx, id, scene.headVersion), await versionOf(tx, id, base)]
    if (!head || !from) throw notFound('version')
    if (draft === 'saved') await upsertDraft(tx, person.id, id, { base, document })
    const members: SaveConflict = {
      head: versionAnswer(head),
      base: versionAnswer(from),
      yours: { base, message, document },
    }
    return new Problem(
      'conflict',
      `Version ${head.number} was saved by ${head.author} after the version ${base} that yours was made from.`,
      `Compare the two; then save yours on top of it, save it as a scene of its own, or let it go.${draft === 'saved' ? ' It is kept as your draft.' : ''}`,
      { members: { ...members } },
    )
  })
}
