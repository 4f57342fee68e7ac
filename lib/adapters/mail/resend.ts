import type { MailSettings } from '@/lib/config/mail-settings'
import { MailRefused, type Mail, type Mailer } from './port'

type Settings = Extract<MailSettings, { by: 'resend' }>

const named = (name: string, email: string) => `"${name.replace(/["\\\r\n]/g, ' ')}" <${email}>`

/** Sends through a hosted sender, which knows a mail it has taken by its idempotency key, for a day. */
export const resendMailer = ({ apiKey, baseUrl }: Settings): Mailer => ({
  repeatable: true,
  async send(mail: Mail) {
    const { Resend } = await import('resend')
    const { error } = await new Resend(apiKey, { baseUrl }).emails.send(
      {
        from: named(mail.from.name, mail.from.email),
        to: named(mail.to.name, mail.to.email),
        replyTo: mail.replyTo,
        headers: { ...mail.headers, 'Message-ID': mail.messageId },
        ...{ subject: mail.subject, text: mail.text, html: mail.html },
      },
      { idempotencyKey: mail.id, signal: AbortSignal.timeout(60_000) },
    )
    if (!error) return
    const said = `${error.statusCode ?? 'no answer'}: ${error.message}`
    // of this mail, not of our key, our quota or the state of the sender
    const aboutMail =
      error.statusCode === 400 || error.statusCode === 422 || error.name === 'invalid_idempotent_request'
    throw aboutMail ? new MailRefused(said) : new Error(said)
  },
})
