'use server'

import { cookies, headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { blankSessionCookie } from '@/lib/auth/sessions'
import { sessionCookieName } from '@/lib/auth/session-cookie-name'
import { requireSameOrigin } from '@/lib/http/same-origin'
import { signOut } from '@/lib/services/sign-out'

/** The one action every sheet carries. The framework lets a request without an Origin through; we do not. */
export async function signOutAction() {
  requireSameOrigin({ headers: await headers() })
  const jar = await cookies()
  const token = jar.get(sessionCookieName)?.value
  if (token) await signOut(token)
  const blank = blankSessionCookie()
  jar.set(blank.name, blank.value, blank.attributes)
  redirect('/')
}
