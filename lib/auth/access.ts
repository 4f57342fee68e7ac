/** What a role in a workshop may do: the one table behind the server's checks, hidden controls and their tests. */
export const roles = ['owner', 'designer', 'sales', 'service', 'reviewer'] as const
export type Role = (typeof roles)[number]

/** What a share link lets its holder do, each more than the one before. */
export const linkKinds = ['look', 'note', 'decide'] as const
export type LinkKind = (typeof linkKinds)[number]

/** Who may hold a right: a role in the workshop, or a link to one scene of it. */
export type Holder = Role | `link:${LinkKind}`
export const holders: readonly Holder[] = [
  ...roles,
  ...linkKinds.map((kind): `link:${LinkKind}` => `link:${kind}`),
]

const everyone: readonly Role[] = roles
const makers: readonly Role[] = ['owner', 'designer']
const judges: readonly Role[] = ['owner', 'reviewer']
const senders: readonly Role[] = ['owner', 'designer', 'sales']
const anyLink = ['link:look', 'link:note', 'link:decide'] as const
const notingLink = ['link:note', 'link:decide'] as const

export const access = {
  'scene.list': everyone,
  'scene.read': [...everyone, ...anyLink],
  'scene.create': makers,
  'scene.save': makers,
  'scene.rename': makers,
  'scene.duplicate': ['owner', 'designer', 'service'],
  'scene.archive': makers,
  'scene.restore': makers,
  'draft.keep': everyone,

  'note.read': [...everyone, ...notingLink],
  'note.write': ['owner', 'designer', 'reviewer', ...notingLink],
  // one's own; anybody's with the next
  'note.settle': ['owner', 'designer', 'reviewer'],
  'note.settle-any': judges,
  // what somebody else wrote; one's own goes with writing
  'note.delete-any': ['owner'],

  'review.read': everyone,
  'review.ask': makers,
  'verdict.give': [...judges, 'link:decide'],
  'version.withdraw': makers,

  'link.list': senders,
  'link.create': senders,
  'link.change': senders,
  'link.endless': ['owner'],
  'link.revoke': senders,
  'link.openings': senders,
  'link.erase': senders,
  'opening.count': anyLink,
  'question.ask': anyLink,

  'workshop.read': everyone,
  'workshop.change': ['owner'],
  'workshop.transfer': ['owner'],
  'workshop.leave': everyone,
  'person.list': everyone,
  'person.invite': ['owner'],
  'person.change-role': ['owner'],
  'person.remove': ['owner'],
  'token.keep': everyone,
  'audit.read': ['owner'],
  'mail.read': ['owner'],
  'mail.resend': ['owner'],
} as const satisfies Record<string, readonly Holder[]>

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
  /** The workshop before them, one of the above; null for somebody who belongs to none. */
  workshopId: string | null
}

/** Whoever holds a link: may do to the one scene it opens what its kind lets, and nothing else. */
export interface Guest {
  linkId: string
  sceneId: string
  kind: LinkKind
}

export const holds = (holder: Holder, operation: Operation) =>
  (access[operation] as readonly Holder[]).includes(holder)

export const operationsOf = (holder: Holder) => operations.filter((operation) => holds(holder, operation))

export const roleIn = (person: Person, workshopId: string): Role | undefined =>
  person.memberships.find((membership) => membership.workshopId === workshopId)?.role

/** Their place in the workshop before them. */
export const presentMembership = (person: Person): Membership | null =>
  person.memberships.find((membership) => membership.workshopId === person.workshopId) ?? null

/** Whether the first role holds nothing that the second does not: then who has the second may hand it on. */
export const isWithin = (role: Role, other: Role) =>
  operationsOf(role).every((operation) => holds(other, operation))

/** The lesser of two roles; of two that hold different things neither is. */
export const lesserRole = (one: Role, other: Role): Role | null =>
  isWithin(one, other) ? one : isWithin(other, one) ? other : null

/** The whole judgement: may this one do this to something of that workshop? */
export function allow(
  who: Person | Guest | null,
  operation: Operation,
  resource: { workshopId: string; sceneId?: string },
): boolean {
  if (who === null) return false
  if ('sceneId' in who) return who.sceneId === resource.sceneId && holds(`link:${who.kind}`, operation)
  const role = roleIn(who, resource.workshopId)
  return role !== undefined && holds(role, operation)
}
