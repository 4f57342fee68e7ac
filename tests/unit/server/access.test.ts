import { describe, expect, it } from 'vitest'
import { access, allow, operations, operationsOf, roles, type Person, type Role } from '@/lib/auth/access'

const person = (role: Role): Person => ({
  id: 'p',
  name: 'P',
  email: 'p@example.com',
  memberships: [{ workshopId: 'ours', workshopName: 'Ours', role }],
})
const cases = roles.flatMap((role) => operations.map((operation) => ({ role, operation })))

describe('allow()', () => {
  it.each(cases)(
    'allow($role, $operation) follows the table, in the own workshop alone',
    ({ role, operation }) => {
      const expected = (access[operation] as readonly Role[]).includes(role)
      expect(allow(person(role), operation, { workshopId: 'ours' })).toBe(expected)
      expect(allow(person(role), operation, { workshopId: 'theirs' })).toBe(false)
      expect(operationsOf(role).includes(operation)).toBe(expected)
    },
  )

  it.each(operations)('allow(null, %s) is false', (operation) => {
    expect(allow(null, operation, { workshopId: 'ours', sceneId: 's' })).toBe(false)
  })

  it.each(operations)(
    'allow(guest, %s) lets a guest read the scene of the link and nothing else',
    (operation) => {
      expect(allow({ sceneId: 's' }, operation, { workshopId: 'ours', sceneId: 's' })).toBe(
        operation === 'scene.read',
      )
      expect(allow({ sceneId: 's' }, operation, { workshopId: 'ours', sceneId: 't' })).toBe(false)
      expect(allow({ sceneId: 's' }, operation, { workshopId: 'ours' })).toBe(false)
    },
  )

  it('the owner may do everything, and every operation belongs to somebody', () => {
    expect(operationsOf('owner')).toEqual(operations)
    for (const operation of operations) expect(access[operation].length).toBeGreaterThan(0)
  })
})
