import { once } from 'node:events'
import { createServer, type IncomingHttpHeaders } from 'node:http'
import { createServer as createSocketServer, type AddressInfo } from 'node:net'
import { json } from 'node:stream/consumers'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { MailRefused, MailUnsure, type Mail } from '@/lib/adapters/mail/port'
import { resendMailer } from '@/lib/adapters/mail/resend'
import { smtpMailer } from '@/lib/adapters/mail/smtp'
import { startMailServer, type MailServer } from '../../support/smtp'

const from = { name: 'Larkspur, post', email: 'post@larkspur.example' }
const mail = (last: string): Mail => ({
  id: `0190a000-0000-7000-8000-00000000000${last}`,
  messageId: `<0190a000-0000-7000-8000-00000000000${last}@larkspur.example>`,
  from,
  to: { name: 'Ines "Q"', email: 'ines@example.com' },
  replyTo: 'delphine@example.com',
  subject: '90° V8, crank pin 3',
  text: 'It turns.\n',
  html: '<p>It turns.</p>',
  headers: {
    'List-Unsubscribe': '<https://counterthrow.example/u/1>',
    'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
  },
})

describe('smtpMailer()', () => {
  let server: MailServer
  beforeAll(async () => {
    server = await startMailServer()
  })
  afterAll(() => server.close())

  const send = (last: string, url = server.url) => {
    const { hostname, port } = new URL(url)
    const settings = { by: 'smtp', from, host: hostname, port: Number(port), tls: false } as const
    return smtpMailer({ ...settings, user: '', password: '' }).send(mail(last))
  }

  it('sends text and HTML with the Message-ID of the row and the headers of RFC 8058', async () => {
    await send('3')
    const received = server.received.at(-1)
    expect(received).toMatchObject({
      to: ['ines@example.com'],
      messageId: mail('3').messageId,
      subject: '90° V8, crank pin 3',
      text: 'It turns.\n',
      html: '<p>It turns.</p>',
    })
    expect(received?.raw).toMatch(/^List-Unsubscribe: <https:\/\/counterthrow\.example\/u\/1>\r$/m)
    expect(received?.raw).toMatch(/^List-Unsubscribe-Post: List-Unsubscribe=One-Click\r$/m)
    expect(received?.raw).toMatch(/^From: "Larkspur, post" <post@larkspur\.example>\r$/m)
    expect(received?.raw).toMatch(/^Reply-To: delphine@example\.com\r$/m)
  })

  it.each(['recipient', 'mail'] as const)('a 5xx at the %s is a refusal', async (at) => {
    const before = server.received.length
    server.refuse(550, 'No such mailbox', at)
    const refused = await send('4').catch((error: unknown) => error)
    expect(refused).toBeInstanceOf(MailRefused)
    expect((refused as Error).message).toContain('No such mailbox')
    expect(server.received).toHaveLength(before)
  })

  it.each(['recipient', 'mail'] as const)('a 4xx at the %s is none: it may be tried again', async (at) => {
    server.refuse(451, 'Come back later', at)
    const error = await send('5').catch((thrown: unknown) => thrown)
    expect(error).toBeInstanceOf(Error)
    expect(error).not.toBeInstanceOf(MailRefused)
    expect(error).not.toBeInstanceOf(MailUnsure)
  })

  it('a connection that ends after the whole mail, without an answer, leaves nobody sure', async () => {
    const before = server.received.length
    server.drop()
    await expect(send('6')).rejects.toBeInstanceOf(MailUnsure)
    expect(server.received).toHaveLength(before + 1)
  })

  it('a connection that ends before the mail, or cannot be made, leaves nothing in doubt', async () => {
    const rude = createSocketServer((socket) => socket.destroy()).listen(0, '127.0.0.1')
    await once(rude, 'listening')
    const { port } = rude.address() as AddressInfo
    const cutOff = await send('7', `smtp://127.0.0.1:${port}`).catch((error: unknown) => error)
    rude.close()
    await once(rude, 'close')
    const closed = await send('7', `smtp://127.0.0.1:${port}`).catch((error: unknown) => error)
    for (const error of [cutOff, closed]) {
      expect(error).toBeInstanceOf(Error)
      expect(error).not.toBeInstanceOf(MailUnsure)
      expect(error).not.toBeInstanceOf(MailRefused)
    }
  })
})

describe('resendMailer()', () => {
  interface Asked {
    headers: IncomingHttpHeaders
    body: Record<string, unknown>
  }
  const asked: Asked[] = []
  let answer: { status: number; body: object }
  const hosted = createServer(async (request, response) => {
    asked.push({ headers: request.headers, body: (await json(request)) as Asked['body'] })
    response.writeHead(answer.status, { 'content-type': 'application/json' }).end(JSON.stringify(answer.body))
  })
  let baseUrl: string
  beforeAll(async () => {
    hosted.listen(0, '127.0.0.1')
    await once(hosted, 'listening')
    baseUrl = `http://127.0.0.1:${(hosted.address() as AddressInfo).port}`
  })
  afterAll(() => hosted.close())

  const send = (last: string, at = baseUrl) =>
    resendMailer({ by: 'resend', from, apiKey: 'the-key', baseUrl: at }).send(mail(last))
  const outcome = (status: number, name: string) => {
    answer = { status, body: { statusCode: status, name, message: `said ${name}` } }
    return send('9').catch((error: unknown) => error)
  }

  it('hands over the whole mail under the key of its row', async () => {
    answer = { status: 200, body: { id: 'taken' } }
    await send('8')
    const { headers, body } = asked[0]
    expect(headers).toMatchObject({ 'idempotency-key': mail('8').id, authorization: 'Bearer the-key' })
    expect(body).toMatchObject({
      from: '"Larkspur, post" <post@larkspur.example>',
      to: '"Ines  Q " <ines@example.com>',
      reply_to: 'delphine@example.com',
      subject: '90° V8, crank pin 3',
      text: 'It turns.\n',
      html: '<p>It turns.</p>',
      headers: { ...mail('8').headers, 'Message-ID': mail('8').messageId },
    })
  })

  it.each([
    [422, 'validation_error'],
    [400, 'missing_required_field'],
    [409, 'invalid_idempotent_request'],
  ])('%i %s is a refusal', async (status, name) => {
    const error = await outcome(status, name)
    expect(error).toBeInstanceOf(MailRefused)
    expect((error as Error).message).toContain(`said ${name}`)
  })

  it.each([
    [409, 'concurrent_idempotent_requests'],
    [429, 'rate_limit_exceeded'],
    [401, 'missing_api_key'],
    [500, 'internal_server_error'],
  ])('%i %s may be tried again', async (status, name) => {
    const error = await outcome(status, name)
    expect(error).toBeInstanceOf(Error)
    expect(error).not.toBeInstanceOf(MailRefused)
  })

  it('a sender that cannot be reached may be tried again', async () => {
    const error = await send('9', 'http://127.0.0.1:1').catch((thrown: unknown) => thrown)
    expect(error).toBeInstanceOf(Error)
    expect(error).not.toBeInstanceOf(MailRefused)
  })
})
