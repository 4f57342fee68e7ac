/** What a role in a workshop may do: the one table behind the server's checks, hidden controls and their tests. */
export const roles = ['owner', 'designer', 'sales', 'service', 'reviewer'] as const
export type Role = (typeof roles)[number]

const everyone: readonly Role[] = roles
const makers: readonly Role[] = ['owner', 'designer']

export const access = {
  'scene.list': everyone,
  'scene.read': everyone,
  'scene.create': makers,
  'scene.save': makers,
  'scene.rename': makers,
  'scene.duplicate': ['owner', 'designer', 'service'],
  'scene.archive': makers,
  'scene.restore': makers,
  'draft.keep': everyone,
  'link.list': ['owner', 'designer', 'sales'],
  'link.create': ['owner', 'designer', 'sales'],
  'link.revoke': ['owner', 'designer', 'sales'],
} as const satisfies Record<string, readonly Role[]>

export type Operation = keyof typeof access
export const operations = Object.keys(access) as Operation[]

export interface Membership {
  workshopId: string
  workshopName: string
  role: Role
}

export interface Person {
  id: string
  name: string
  email: string
  memberships: Membership[]
}

/** Whoever holds a link: may look at the one scene it opens, and nothing else. */
export interface Guest {
  sceneId: string
}

export const roleAllows = (role: Role, operation: Operation) =>
  (access[operation] as readonly Role[]).includes(role)

export const operationsOf = (role: Role) => operations.filter((operation) => roleAllows(role, operation))

export const roleIn = (person: Person, workshopId: string): Role | undefined =>
  person.memberships.find((membership) => membership.workshopId === workshopId)?.role

/** The whole judgement: may this one do this to something of that workshop? */
export function allow(
  who: Person | Guest | null,
  operation: Operation,
  resource: { workshopId: string; sceneId?: string },
): boolean {
  if (who === null) return false
  if ('sceneId' in who) return operation === 'scene.read' && resource.sceneId === who.sceneId
  const role = roleIn(who, resource.workshopId)
  return role !== undefined && roleAllows(role, operation)
}
