'use server'

import { cookies, headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { currentPerson } from '@/lib/auth/current-person'
import { blankSessionCookie } from '@/lib/auth/sessions'
import { sessionCookieName } from '@/lib/auth/session-cookie-name'
import { ownPage } from '@/lib/contracts/own-page'
import { requireSameOrigin } from '@/lib/http/same-origin'
import { chooseWorkshop } from '@/lib/services/choose-workshop'
import { signOut } from '@/lib/services/sign-out'

// The actions that every sheet carries. The framework lets a request without an Origin through; we do not.

export async function signOutAction(form: FormData) {
  requireSameOrigin({ headers: await headers() })
  const jar = await cookies()
  const token = jar.get(sessionCookieName)?.value
  if (token) await signOut(token)
  const blank = blankSessionCookie()
  jar.set(blank.name, blank.value, blank.attributes)
  redirect(ownPage(form.get('next'), '/'))
}

export async function goOverAction(form: FormData) {
  requireSameOrigin({ headers: await headers() })
  await chooseWorkshop(await currentPerson(), String(form.get('workshop')))
  redirect('/scenes')
}
