import { describe, expect, it } from 'vitest'
import {
  access,
  allow,
  holds,
  isWithin,
  lesserRole,
  linkKinds,
  operations,
  operationsOf,
  roles,
  type Guest,
  type Holder,
  type Person,
  type Role,
} from '@/lib/auth/access'

const person = (role: Role): Person => ({
  id: 'p',
  name: 'P',
  email: 'p@example.com',
  memberships: [{ workshopId: 'ours', workshopName: 'Ours', role }],
  workshopId: 'ours',
})
const cases = roles.flatMap((role) => operations.map((operation) => ({ role, operation })))

describe('isWithin() and lesserRole()', () => {
  const pairs = roles.flatMap((one) => roles.map((other) => ({ one, other })))

  it.each(pairs)('isWithin($one, $other) means that nothing more comes with the first', ({ one, other }) => {
    const more = operations.filter((operation) => holds(one, operation) && !holds(other, operation))
    expect(isWithin(one, other)).toBe(more.length === 0)
  })

  it.each(pairs)('lesserRole($one, $other) is within both, whichever comes first', ({ one, other }) => {
    const lesser = lesserRole(one, other)
    expect(lesserRole(other, one)).toBe(lesser)
    if (lesser) expect([isWithin(lesser, one), isWithin(lesser, other)]).toEqual([true, true])
    else expect([isWithin(one, other), isWithin(other, one)]).toEqual([false, false])
  })

  it('every role is within an owner’s, and a sales engineer’s is not a reviewer’s', () => {
    for (const role of roles) expect(lesserRole(role, 'owner')).toBe(role)
    expect(lesserRole('sales', 'reviewer')).toBeNull()
  })
})

describe('allow()', () => {
  it.each(cases)(
    'allow($role, $operation) follows the table, in the own workshop alone',
    ({ role, operation }) => {
      const expected = (access[operation] as readonly Holder[]).includes(role)
      expect(allow(person(role), operation, { workshopId: 'ours' })).toBe(expected)
      expect(allow(person(role), operation, { workshopId: 'theirs' })).toBe(false)
      expect(operationsOf(role).includes(operation)).toBe(expected)
    },
  )

  it.each(operations)('allow(null, %s) is false', (operation) => {
    expect(allow(null, operation, { workshopId: 'ours', sceneId: 's' })).toBe(false)
  })

  it.each(linkKinds.flatMap((kind) => operations.map((operation) => ({ kind, operation }))))(
    'allow(guest with a link to $kind, $operation) follows the table, on the scene of the link alone',
    ({ kind, operation }) => {
      const guest: Guest = { linkId: 'l', sceneId: 's', kind }
      const expected = (access[operation] as readonly Holder[]).includes(`link:${kind}`)
      expect(allow(guest, operation, { workshopId: 'ours', sceneId: 's' })).toBe(expected)
      expect(allow(guest, operation, { workshopId: 'ours', sceneId: 't' })).toBe(false)
      expect(allow(guest, operation, { workshopId: 'ours' })).toBe(false)
    },
  )

  it('a link lets no more than one of a kind above it, and a look nothing but looking, being counted and asking', () => {
    expect(operationsOf('link:look')).toEqual(['scene.read', 'opening.count', 'question.ask'])
    for (const operation of operationsOf('link:look')) expect(holds('link:note', operation)).toBe(true)
    for (const operation of operationsOf('link:note')) expect(holds('link:decide', operation)).toBe(true)
  })

  it('the owner may do everything that people may, and every operation belongs to somebody', () => {
    const ofPeople = operations.filter((operation) => roles.some((role) => holds(role, operation)))
    expect(operationsOf('owner')).toEqual(ofPeople)
    for (const operation of operations) expect(access[operation].length).toBeGreaterThan(0)
  })
})
