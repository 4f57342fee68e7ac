import { headers } from 'next/headers'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import type { SharedScene } from '@/lib/contracts/shared'
import { Problem } from '@/lib/errors/problem'
import { linkKeyOf } from '@/lib/http/link-key'
import { openShareLink } from '@/lib/services/open-share-link'

export type LinkSearch = Record<string, string | string[] | undefined>

export const wordOf = (search: LinkSearch, name: string) => {
  const value = search[name]
  return typeof value === 'string' ? value : null
}

/** What a link opens, asked once a request; null where a password is wanted. The rest is not there, and looks alike. */
export const openedLink = cache(async (token: string, pass: string | null): Promise<SharedScene | null> => {
  try {
    const key = linkKeyOf({ headers: await headers() }, token)
    return await openShareLink(pass === null ? key : { token, pass })
  } catch (error) {
    if (error instanceof Problem && error.kind === 'password-wanted') return null
    if (error instanceof Problem && error.status === 404) notFound()
    throw error
  }
})
