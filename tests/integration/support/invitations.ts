import { expect } from 'vitest'
import type postgres from 'postgres'
import type { Role } from '@/lib/auth/access'
import type { Invitation } from '@/lib/contracts/invitations'
import { call, type Asked } from './call'
import type { Someone } from './people'

export const ask = (owner: Someone, email: string, role: Role = 'designer') =>
  call('POST', `/api/v1/workshops/${owner.workshopId}/invitations`, {
    cookie: owner.cookie,
    body: { email, role },
  })

/** The token of the last invitation that was put into the post for this address. */
export async function tokenFor(sql: postgres.Sql, email: string): Promise<string> {
  const [row] = await sql`
    select data ->> 'url' as url from mails
    where to_email = ${email} and template = 'invitation' order by created_at desc, id desc limit 1`
  return new URL(row.url).searchParams.get('token') ?? ''
}

export async function invite(sql: postgres.Sql, owner: Someone, email: string, role: Role = 'designer') {
  const answer = await ask(owner, email, role)
  expect(answer.status).toBe(201)
  const { invitation } = answer.body as { invitation: Invitation }
  return { invitation, token: await tokenFor(sql, email) }
}

export const look = (token: string, asked: Asked = {}) => call('GET', `/api/v1/invited/${token}`, asked)

export const accept = (token: string, asked: Asked = {}) =>
  call('POST', `/api/v1/invited/${token}`, { body: {}, ...asked })

export const withAccount = (name: string, password: string): Asked => ({
  body: { account: { name, password } },
})
