import { eq } from 'drizzle-orm'
import type { Transaction } from '../client'
import { users } from '../schema'

export async function userByEmail(tx: Transaction, email: string) {
  const [user] = await tx.select().from(users).where(eq(users.email, email))
  return user
}

export async function userById(tx: Transaction, id: string) {
  const [user] = await tx.select().from(users).where(eq(users.id, id))
  return user
}
