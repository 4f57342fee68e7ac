import { keepMailPreference as keepContract, readMailPreferences as readContract } from '@/lib/contracts/mail'
import { handle } from '@/lib/http/handle'
import { keepMailPreference, readMailPreferences } from '@/lib/services/mail/mail-preferences'

export const GET = handle(readContract, ({ person }) => readMailPreferences(person))

export const PUT = handle(keepContract, ({ person, body }) =>
  keepMailPreference(person, body.kind, body.wanted),
)
