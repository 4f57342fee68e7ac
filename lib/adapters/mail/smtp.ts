import type { MailSettings } from '@/lib/config/mail-settings'
import { MailRefused, MailUnsure, type Mail, type Mailer } from './port'

type Settings = Extract<MailSettings, { by: 'smtp' }>

const second = 1000
const loopback = new Set(['127.0.0.1', '[::1]', 'localhost'])

/** Sends through a mail server. It cannot be asked whether it has taken a mail whose answer was lost (RFC 1047). */
export const smtpMailer = ({ host, port, tls, user, password }: Settings): Mailer => ({
  repeatable: false,
  async send(mail: Mail) {
    const { createTransport } = await import('nodemailer')
    let handedOver = false
    const transport = createTransport({
      ...{ host, port, secure: tls },
      auth: user ? { user, pass: password } : undefined,
      // a password or a link never crosses a network in clear
      requireTLS: !tls && !loopback.has(host),
      tls: { minVersion: 'TLSv1.2' },
      ...{ dnsTimeout: 10 * second, connectionTimeout: 10 * second, greetingTimeout: 20 * second },
      socketTimeout: 60 * second,
      ...{ disableFileAccess: true, disableUrlAccess: true },
      logger: {
        info: (entry: { tnx?: string }) => {
          if (entry.tnx === 'message') handedOver = true
        },
      },
    })
    try {
      await transport.sendMail({
        from: { name: mail.from.name, address: mail.from.email },
        to: { name: mail.to.name, address: mail.to.email },
        ...{ replyTo: mail.replyTo, messageId: mail.messageId, headers: mail.headers },
        ...{ subject: mail.subject, text: mail.text, html: mail.html },
      })
    } catch (error) {
      throw asOutcome(error, handedOver)
    } finally {
      transport.close()
    }
  },
})

function asOutcome(error: unknown, handedOver: boolean): unknown {
  if (!(error instanceof Error)) return error
  const { responseCode, command = '' } = error as Error & { responseCode?: number; command?: string }
  if (handedOver && responseCode === undefined) {
    return new MailUnsure(`No answer after the mail was handed over: ${error.message}`, { cause: error })
  }
  // what is said to us before the mail is about our settings, which may be mended
  const aboutMail = ['MAIL FROM', 'RCPT TO', 'DATA'].includes(command)
  if (aboutMail && responseCode && responseCode >= 500)
    return new MailRefused(error.message, { cause: error })
  return error
}
