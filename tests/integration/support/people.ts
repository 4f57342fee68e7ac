import { expect } from 'vitest'
import type postgres from 'postgres'
import type { Role } from '@/lib/auth/access'
import type { PersonAnswer } from '@/lib/contracts/people'
import { call } from './call'
import { newEmail } from './server'

export const password = 'correct horse battery'

export interface Someone {
  id: string
  email: string
  cookie: string
  workshopId: string
}

export const cookieOf = (headers: Headers) => (headers.get('set-cookie') ?? '').split(';')[0]

/** Signs somebody up: owner of a workshop of their own. */
export async function newOwner(name = 'Tamsin Orrelby'): Promise<Someone> {
  const email = newEmail()
  const answer = await call('POST', '/api/v1/auth/sign-up', { body: { name, email, password } })
  expect(answer.status).toBe(201)
  const { person } = answer.body as { person: PersonAnswer }
  return { id: person.id, email, cookie: cookieOf(answer.headers), workshopId: person.workshops[0].id }
}

/** Somebody with this role in that workshop and in no other. */
export async function newMember(sql: postgres.Sql, workshopId: string, role: Role): Promise<Someone> {
  const someone = await newOwner(`A ${role}`)
  await sql`delete from memberships where user_id = ${someone.id}`
  await sql`insert into memberships (workshop_id, user_id, role) values (${workshopId}, ${someone.id}, ${role})`
  return { ...someone, workshopId }
}
