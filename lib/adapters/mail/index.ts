import { config } from '@/lib/config'
import { localMailer } from './local'
import type { Mailer } from './port'
import { resendMailer } from './resend'
import { smtpMailer } from './smtp'

/** The way that MAIL chooses. */
export function mailer(): Mailer {
  const { mail } = config()
  if (mail.by === 'smtp') return smtpMailer(mail)
  if (mail.by === 'resend') return resendMailer(mail)
  return localMailer
}
