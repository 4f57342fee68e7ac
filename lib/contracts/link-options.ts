import { z } from 'zod'
import { linkKinds } from '@/lib/auth/access'
import { timeSchema } from './common'

export const mostOfLinks = { label: 120, frames: 20, password: { least: 6, most: 200 } } as const

const host = /^(?:[a-z0-9-]+\.)*[a-z0-9-]+$|^\[[0-9a-f:]+\]$/
const here = new Set(['127.0.0.1', 'localhost', '[::1]'])

/** The origin that a text names, as browsers write it; null where it names none that may be trusted with a frame. */
export function originOf(text: string): string | null {
  const trimmed = text.trim()
  if (!URL.canParse(trimmed)) return null
  const url = new URL(trimmed)
  const bare = url.pathname === '/' && url.search + url.hash + url.username + url.password === ''
  const safe = url.protocol === 'https:' || (url.protocol === 'http:' && here.has(url.hostname))
  return bare && safe && host.test(url.hostname) ? url.origin : null
}

const originSchema = z
  .string()
  .max(300)
  .superRefine((text, context) => {
    if (originOf(text) !== null) return
    context.addIssue({
      code: 'custom',
      message: `“${text}” is not the address of a site that may show a frame: https, a name, and nothing after it.`,
      params: { fix: 'Give one such as https://www.example.com.' },
    })
  })
  .transform((text) => originOf(text) ?? '')

/** What a link lets, until when, and for whom; each may be changed while the link is not withdrawn. */
export const linkOptions = {
  /** Whom or what it is for, in the workshop's own words. */
  label: z.string().trim().max(mostOfLinks.label),
  kind: z.enum(linkKinds),
  /** Null follows the scene's latest version. */
  version: z.int().min(1).nullable(),
  /** Null is without an end: for owners. */
  endsAt: timeSchema.nullable(),
  /** Null is without one. */
  password: z.string().min(mostOfLinks.password.least).max(mostOfLinks.password.most).nullable(),
  /** Sites whose pages may show the link in a frame. */
  frameOrigins: z.array(originSchema).max(mostOfLinks.frames),
}
