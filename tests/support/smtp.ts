import { once } from 'node:events'
import type { AddressInfo } from 'node:net'
import { buffer } from 'node:stream/consumers'
import { simpleParser, type ParsedMail } from 'mailparser'
import { SMTPServer, type SMTPServerSession } from 'smtp-server'

export interface Received extends Pick<ParsedMail, 'messageId' | 'subject' | 'text' | 'html' | 'headers'> {
  to: string[]
  raw: string
}

/** A mail that has arrived whole and has had no answer yet. */
export interface Held {
  /** Once the mail is here. */
  reached: Promise<Received>
  /** Says that it is taken. */
  release(): void
}

type Manner =
  | { is: 'take' }
  | { is: 'hold'; reached: (mail: Received) => void; released: Promise<void> }
  | { is: 'refuse'; code: number; words: string; at: 'recipient' | 'mail' }
  | { is: 'drop' }

export interface MailServer {
  /** For SMTP_URL. */
  url: string
  /** What has arrived whole, in this order, whether it was answered or not. */
  received: Received[]
  /** The next mail arrives and waits for its answer. */
  hold(): Held
  /** The next mail is refused: at its recipient or, `at` the mail, when it is here. */
  refuse(code: number, words: string, at?: 'recipient' | 'mail'): void
  /** The next mail arrives whole and the connection ends without an answer. */
  drop(): void
  close(): Promise<void>
}

const refusal = (code: number, words: string) => Object.assign(new Error(words), { responseCode: code })

/** A mail server on the loopback that does as it is told with the next mail, and takes every other. */
export async function startMailServer(): Promise<MailServer> {
  const received: Received[] = []
  const coming: Manner[] = []
  const mannerOf = new WeakMap<SMTPServerSession, Manner>()

  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    closeTimeout: 100,
    onRcptTo(_address, session, done) {
      const manner = mannerOf.get(session) ?? coming.shift() ?? { is: 'take' }
      mannerOf.set(session, manner)
      if (manner.is === 'refuse' && manner.at === 'recipient') return done(refusal(manner.code, manner.words))
      done()
    },
    async onData(stream, session, done) {
      const raw = (await buffer(stream)).toString()
      const { messageId, subject, text, html, headers } = await simpleParser(raw)
      const to = session.envelope.rcptTo.map(({ address }) => address)
      const mail = { to, raw, messageId, subject, text, html, headers }
      const manner = mannerOf.get(session) ?? { is: 'take' }
      if (manner.is === 'refuse') return done(refusal(manner.code, manner.words))
      received.push(mail)
      if (manner.is === 'drop') {
        for (const { id, _socket } of server.connections) if (id === session.id) _socket.destroy()
        return
      }
      if (manner.is === 'hold') {
        manner.reached(mail)
        await manner.released
      }
      done()
    },
  })
  // a client that is killed while it waits is what some tests are about
  server.on('error', () => {})
  server.listen(0, '127.0.0.1')
  await once(server.server, 'listening')
  const { port } = server.server.address() as AddressInfo

  return {
    url: `smtp://127.0.0.1:${port}`,
    received,
    hold() {
      const arrival = gate<Received>()
      const answer = gate<void>()
      coming.push({ is: 'hold', reached: arrival.open, released: answer.passed })
      return { reached: arrival.passed, release: answer.open }
    },
    refuse: (code, words, at = 'recipient') => void coming.push({ is: 'refuse', code, words, at }),
    drop: () => void coming.push({ is: 'drop' }),
    close: () => new Promise((resolve) => server.close(() => resolve())),
  }
}

function gate<T>() {
  let open: (value: T) => void = () => {}
  const passed = new Promise<T>((resolve) => (open = resolve))
  return { passed, open }
}
