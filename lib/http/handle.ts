import type { z } from 'zod'
import type { Person } from '@/lib/auth/access'
import { takeToken } from '@/lib/auth/rate-limit'
import type { AnswerOf, BodyOf, OperationContract, ParamsOf, QueryOf } from '@/lib/contracts/operation'
import { requestIssues } from '@/lib/contracts/request-issues'
import { notByToken, notFound, notSignedIn, Problem, refused, tokenUnknown } from '@/lib/errors/problem'
import { apiTokenOf, personOf } from './caller'
import { clientAddress } from './client-address'
import { problemResponse } from './problem-response'
import { readJson } from './read-json'
import { requireSameOrigin } from './same-origin'

export interface Input<O extends OperationContract> {
  request: Request
  person: O['for'] extends 'person' ? Person : null
  params: ParamsOf<O>
  query: QueryOf<O>
  body: BodyOf<O>
  idempotencyKey: string | undefined
  /** Headers of the answer. */
  headers: Headers
}

interface Context {
  params: Promise<Record<string, string | string[] | undefined>>
}

function parse(schema: z.ZodType | undefined, value: unknown) {
  if (!schema) return undefined
  const result = schema.safeParse(value)
  if (!result.success) throw refused(requestIssues(result.error, value))
  return result.data
}

function idempotencyKeyOf(request: Request) {
  const key = request.headers.get('idempotency-key')
  if (key === null) return undefined
  if (/^[\x21-\x7e]{8,100}$/.test(key)) return key
  throw new Problem(
    'unreadable',
    'The Idempotency-Key cannot be used.',
    'Give 8 to 100 printable characters, such as a UUID.',
  )
}

/**
 * A route handler from its contract: limits, origin, session and parsing come first, so that what is handed to
 * `answer` is good data from a known person. Permission is the services' business.
 */
export function handle<O extends OperationContract>(
  operation: O,
  answer: (input: Input<O>) => Promise<AnswerOf<O> | Response>,
) {
  return async (request: Request, context: Context): Promise<Response> => {
    try {
      await takeToken(operation.limit, clientAddress(request))
      const byToken = apiTokenOf(request) !== null
      if (operation.method !== 'GET' && !byToken) requireSameOrigin(request)
      const person = operation.for === 'person' ? await personOf(request) : null
      if (operation.for === 'person' && !person) throw byToken ? tokenUnknown() : notSignedIn()
      if (operation.atPage && byToken) throw notByToken()

      const params = operation.params?.safeParse(await context.params)
      if (params?.success === false) throw notFound('address')
      const query = parse(operation.query, Object.fromEntries(new URL(request.url).searchParams))
      const body = operation.body && parse(operation.body, await readJson(request))

      const headers = new Headers({ 'cache-control': 'no-store' })
      const input = {
        request,
        person,
        params: params?.data,
        query,
        body,
        idempotencyKey: operation.idempotent ? idempotencyKeyOf(request) : undefined,
        headers,
      } as Input<O>
      const result = await answer(input)
      if (result instanceof Response) return result
      if (result === undefined) return new Response(null, { status: operation.status, headers })
      return Response.json(result, { status: operation.status, headers })
    } catch (error) {
      return problemResponse(error, request)
    }
  }
}
