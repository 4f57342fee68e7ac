import { and, eq, inArray, isNull, lt, sql } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { reviewRequests, versionStates } from '@/db/schema'
import { Problem } from '@/lib/errors/problem'
import { heldBy, type Ground } from '@/lib/review/held'
import { nextState, rightOf, type Act } from '@/lib/review/transitions'
import type { VersionState } from '@/lib/review/version-states'
import { audit } from '../audit'
import type { HeldScene } from './review-scene'

interface Move {
  act: Act
  actorId: string | null
  /** Why, where the act asks for it. */
  reason?: string
  /** For the audit log. */
  details?: Record<string, unknown>
}

const verbs: Record<Act, string> = {
  ask: 'be asked about',
  'call-off': 'have its review called off',
  approve: 'be approved',
  'approve-with-remarks': 'be approved',
  'ask-for-changes': 'be asked to change',
  comment: 'be commented on',
  withdraw: 'be withdrawn',
  overtake: 'be superseded',
}

/** Throws what holds the act up, as the page says it. */
export function refuseHeld(act: Act, number: number, ground: Ground): void {
  const held = heldBy(act, ground)
  if (!held) return
  throw new Problem(
    'held',
    `Version ${number} cannot ${verbs[act]} now: ${held.words}.`,
    'Look at it again as it is now.',
    { members: { held: held.code, state: ground.state } },
  )
}

/** The one place where a version changes its state, by the table of transitions. The scene is held by the caller. */
export async function moveVersion(tx: Transaction, scene: HeldScene, move: Move): Promise<VersionState> {
  const { number, state: from } = scene.version
  const to = nextState(from, move.act)
  if (to === undefined) throw new Error(`A version that is ${from} knows no “${move.act}”.`)
  const { act, actorId, reason = '', details } = move
  if (to !== from) {
    const values = { state: to, changedBy: actorId, changedAt: sql`now()`, reason }
    await tx
      .insert(versionStates)
      .values({ sceneId: scene.id, number, ...values })
      .onConflictDoUpdate({ target: [versionStates.sceneId, versionStates.number], set: values })
  }
  await audit(tx, {
    actorId,
    workshopId: scene.workshopId,
    operation: rightOf[act] ?? 'version.overtake',
    subject: `scene:${scene.id}`,
    before: { version: number, state: from },
    after: { version: number, state: to, act, ...(reason && { reason }), ...details },
  })
  return to
}

type End = NonNullable<(typeof reviewRequests.$inferSelect)['endedAs']>

/** Ends what was asked about a version and not answered yet. */
export async function endRequest(tx: Transaction, sceneId: string, version: number, endedAs: End) {
  await tx
    .update(reviewRequests)
    .set({ endedAs, endedAt: sql`now()` })
    .where(
      and(
        eq(reviewRequests.sceneId, sceneId),
        eq(reviewRequests.version, version),
        isNull(reviewRequests.endedAt),
      ),
    )
}

/** Older versions in these states are superseded by this one, and what was asked about them has ended. */
export async function overtakeOlder(
  tx: Transaction,
  scene: HeldScene,
  actorId: string,
  states: readonly VersionState[],
): Promise<void> {
  const { number } = scene.version
  const overtaken = await tx.execute<{ number: number }>(sql`
    insert into version_states (scene_id, number, state, changed_by)
    select v.scene_id, v.number, 'superseded', null
    from scene_versions v
    left join version_states s on s.scene_id = v.scene_id and s.number = v.number
    where v.scene_id = ${scene.id} and v.number < ${number}
      and coalesce(s.state, 'draft') in (${sql.join(
        states.map((state) => sql`${state}::version_state`),
        sql`, `,
      )})
    on conflict (scene_id, number) do update
      set state = 'superseded', changed_by = null, changed_at = now(), reason = ''
    returning number`)
  const numbers = overtaken.map((row) => row.number)
  if (numbers.length === 0) return
  await tx
    .update(reviewRequests)
    .set({ endedAs: 'overtaken', endedAt: sql`now()` })
    .where(
      and(
        eq(reviewRequests.sceneId, scene.id),
        lt(reviewRequests.version, number),
        inArray(reviewRequests.version, numbers),
        isNull(reviewRequests.endedAt),
      ),
    )
  await audit(tx, {
    actorId,
    workshopId: scene.workshopId,
    operation: 'version.overtake',
    subject: `scene:${scene.id}`,
    after: { by: number, superseded: numbers.sort((a, b) => a - b) },
  })
}
