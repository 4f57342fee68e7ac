import type { z } from 'zod'
import type { ProblemAnswer } from './common'
import type { AnswerOf, OperationContract } from './operation'

type Given<S> = S extends z.ZodType ? z.input<S> : undefined

interface Request<O extends OperationContract> {
  method: O['method']
  path: O['path']
  params?: Record<string, string | number>
  query?: Partial<Record<keyof Given<O['query']>, string | number | undefined>>
  body?: Given<O['body']>
  /** The same key sent again is carried out once. */
  key?: string
}

/** What the server, or the lack of one, said against a request: a cause and a cure. */
export class Refusal extends Error {
  constructor(
    readonly status: number,
    readonly problem: Pick<ProblemAnswer, 'detail' | 'cure' | 'issues'> & Record<string, unknown>,
  ) {
    super(problem.detail)
  }
}

const offline = () =>
  new Refusal(0, {
    detail: 'The server cannot be reached.',
    cure: 'Check the connection and try again; nothing typed is lost.',
  })

const unlikely = { detail: 'The server did not answer as it should.', cure: 'Try again in a minute.' }

export function addressOf(path: string, params: Record<string, string | number> = {}, query: object = {}) {
  const filled = path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(String(params[name])))
  const search = new URLSearchParams(
    Object.entries(query).flatMap(([name, value]) =>
      value === undefined || value === '' ? [] : [[name, String(value)]],
    ),
  ).toString()
  return search ? `${filled}?${search}` : filled
}

interface Sent {
  body?: unknown
  /** The same key sent again is carried out once. */
  key?: string
}

/** Sends to an address and gives what it answers, or throws what it says against it. */
export async function sendTo<T = void>(
  method: string,
  address: string,
  { body, key }: Sent = {},
): Promise<T> {
  const headers: Record<string, string> = {}
  if (body !== undefined) headers['content-type'] = 'application/json'
  if (key) headers['idempotency-key'] = key
  const response = await fetch(address, {
    method,
    headers,
    body: body === undefined ? undefined : JSON.stringify(body),
  }).catch(() => {
    throw offline()
  })
  const answers = response.headers.get('content-type')?.includes('json')
  if (response.ok) return (answers ? await response.json() : undefined) as T
  const problem = await response.json().catch(() => null)
  throw new Refusal(response.status, problem?.detail ? problem : unlikely)
}

/**
 * The browser's end of the HTTP interface: `call<typeof renameScene>({ method, path, … })`, checked against the
 * contract's type alone, so that a light page carries no schema.
 */
export const call = <O extends OperationContract>({ method, path, params, query, ...sent }: Request<O>) =>
  sendTo<AnswerOf<O>>(method, addressOf(path, params, query), sent)

/** For SWR: the key is the address. */
export async function readAddress<T>(address: string): Promise<T> {
  const response = await fetch(address).catch(() => {
    throw offline()
  })
  const answer = await response.json().catch(() => null)
  if (response.ok) return answer as T
  throw new Refusal(response.status, answer ?? unlikely)
}
