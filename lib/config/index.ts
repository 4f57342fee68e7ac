import { resolve } from 'node:path'
import { z } from 'zod'
import { checkMail, mailSettings, mailVariables, type MailSettings } from './mail-settings'

const environment = z
  .object({
    DATABASE_URL: z.string().min(1),
    /** The folder for everything the product keeps outside the database. */
    COUNTERTHROW_DATA: z.string().default('.data'),
    PORT: z.coerce.number().int().min(1).max(65535).default(3000),
    /** The address people use: in mails and links, and for the origin check. */
    COUNTERTHROW_ORIGIN: z.url({ protocol: /^https?$/ }).optional(),
    /** How many proxies stand in front and add to X-Forwarded-For; without any, nothing it says is believed. */
    COUNTERTHROW_PROXIES: z.coerce.number().int().min(0).max(10).default(0),
    ...mailVariables,
    RATE_LIMIT: z.enum(['on', 'off']).default('on'),
  })
  .superRefine(checkMail)

export interface Config {
  databaseUrl: string
  dataFolder: string
  origin: string
  secure: boolean
  /** Reached by this machine alone: then outgoing mail may be read on a page. */
  loopback: boolean
  proxies: number
  mail: MailSettings
  rateLimits: boolean
}

export const loopbackNames: ReadonlySet<string> = new Set(['127.0.0.1', '[::1]', 'localhost'])

export function readConfig(env: Record<string, string | undefined>): Config {
  // a setting left empty is a setting left out
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ''))
  const result = environment.safeParse(given)
  if (!result.success) throw new Error(`The settings cannot be used.\n${z.prettifyError(result.error)}`)
  const settings = result.data
  const address = new URL(settings.COUNTERTHROW_ORIGIN ?? `http://127.0.0.1:${settings.PORT}`)
  const loopback = loopbackNames.has(address.hostname) && settings.COUNTERTHROW_PROXIES === 0
  return {
    databaseUrl: settings.DATABASE_URL,
    dataFolder: resolve(settings.COUNTERTHROW_DATA),
    origin: address.origin,
    secure: address.protocol === 'https:',
    loopback,
    proxies: settings.COUNTERTHROW_PROXIES,
    mail: mailSettings(settings),
    rateLimits: settings.RATE_LIMIT === 'on' || !loopback,
  }
}

let known: Config | undefined

/** The settings, read at their first use: a build needs none of them. */
export function config(): Config {
  known ??= readConfig(process.env)
  return known
}
