import { beforeAll, describe, expect, it } from 'vitest'
import { access, roles, type Role } from '@/lib/auth/access'
import { nextState, rightOf, type Act } from '@/lib/review/transitions'
import { versionStates } from '@/lib/review/version-states'
import { newScene } from './support/links'
import { newMember, newOwner, type Someone } from './support/people'
import { reviewing } from './support/reviews'
import { useServer } from './support/server'

const server = useServer()
const member = {} as Record<Role, Someone>

beforeAll(async () => {
  const owner = await newOwner()
  for (const role of roles) member[role] = await newMember(server.sql, owner.workshopId, role)
})

describe('every state, act and role', () => {
  const acts = [
    'ask',
    'call-off',
    'approve',
    'approve-with-remarks',
    'ask-for-changes',
    'comment',
    'withdraw',
  ] as const
  const scenes = {} as Record<(typeof versionStates)[number], string>

  beforeAll(async () => {
    for (const state of versionStates) scenes[state] = await newScene(member.designer)
  })

  async function put(state: (typeof versionStates)[number]) {
    const sceneId = scenes[state]
    await server.sql`
      insert into version_states (scene_id, number, state) values (${sceneId}, 1, ${state})
      on conflict (scene_id, number) do update set state = excluded.state`
    await server.sql`update review_requests set ended_as = 'called-off', ended_at = now()
      where scene_id = ${sceneId} and ended_at is null`
    return sceneId
  }

  const send: Record<(typeof acts)[number], (as: Someone, sceneId: string) => Promise<{ status: number }>> = {
    ask: (as, id) => reviewing(as, id).ask([member.reviewer], { checklist: [] }),
    'call-off': (as, id) => reviewing(as, id).callOff(),
    approve: (as, id) => reviewing(as, id).say('approve'),
    'approve-with-remarks': (as, id) => reviewing(as, id).say('approve-with-remarks'),
    'ask-for-changes': (as, id) => reviewing(as, id).say('ask-for-changes'),
    comment: (as, id) => reviewing(as, id).say('comment'),
    withdraw: (as, id) => reviewing(as, id).withdraw('No longer.'),
  }

  const cases = versionStates.flatMap((state) =>
    acts.flatMap((act: Exclude<Act, 'overtake'>) => roles.map((role) => ({ state, act, role }))),
  )

  it.each(cases)('$state, $act, $role', async ({ state, act, role }) => {
    const sceneId = await put(state)
    const { status } = await send[act](member[role], sceneId)
    const right = rightOf[act]
    const allowed = right !== null && (access[right] as readonly string[]).includes(role)
    const next = nextState(state, act)
    if (!allowed) expect(status).toBe(403)
    else if (next === undefined) expect(status).toBe(409)
    else expect(status).toBeLessThan(300)
    const [row] = await server.sql`select state from version_states where scene_id = ${sceneId}`
    expect(row.state).toBe(allowed && next !== undefined ? next : state)
  })
})
