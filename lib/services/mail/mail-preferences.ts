import { eq } from 'drizzle-orm'
import { read, write, type Transaction } from '@/db/client'
import { mailPreferences } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import type { MailPreferences } from '@/lib/contracts/mail'
import { mailKinds, type MailKind } from '@/lib/letters/mail-kinds'
import { audit } from '../audit'

async function preferencesOf(tx: Transaction, userId: string): Promise<MailPreferences> {
  const rows = await tx.select().from(mailPreferences).where(eq(mailPreferences.userId, userId))
  const choices = new Map(rows.map(({ kind, wanted }) => [kind, wanted]))
  return { preferences: mailKinds.map((kind) => ({ kind, wanted: choices.get(kind) ?? true })) }
}

export const readMailPreferences = (person: Person): Promise<MailPreferences> =>
  read((tx) => preferencesOf(tx, person.id))

export const keepMailPreference = (person: Person, kind: MailKind, wanted: boolean) =>
  write(async (tx) => {
    await keepPreference(tx, person.id, kind, wanted)
    return preferencesOf(tx, person.id)
  })

export async function keepPreference(tx: Transaction, userId: string, kind: MailKind, wanted: boolean) {
  const updatedAt = new Date()
  await tx
    .insert(mailPreferences)
    .values({ userId, kind, wanted, updatedAt })
    .onConflictDoUpdate({
      target: [mailPreferences.userId, mailPreferences.kind],
      set: { wanted, updatedAt },
    })
  await audit(tx, {
    actorId: userId,
    workshopId: null,
    operation: 'mail.preference',
    subject: `person:${userId}`,
    after: { kind, wanted },
  })
}
