import 'server-only'
import { cache } from 'react'
import { cookies } from 'next/headers'
import type { Person } from './access'
import { personOfToken } from './person'
import { sessionCookieName } from './session-cookie-name'

/** Who looks at this page, asked once a request; null for a stranger. For server components. */
export const currentPerson = cache(async (): Promise<Person | null> => {
  const jar = await cookies()
  return personOfToken(jar.get(sessionCookieName)?.value)
})
