import type { z } from 'zod'

export type LimitName =
  | 'reading'
  | 'writing'
  | 'analyses'
  | 'printing'
  | 'sign-in'
  | 'sign-up'
  | 'reset'
  | 'shared'
  | 'guest-writing'
  | 'inviting'

/**
 * One operation of the HTTP interface: what the route handler parses and answers, what the client may rely on,
 * and what /api/v1/openapi.json says, all from here.
 */
export interface OperationContract {
  id: string
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'
  path: `/api/v1/${string}`
  summary: string
  /** `anyone` is open to strangers; `person` wants a signed-in one. */
  for: 'anyone' | 'person'
  /** What concerns somebody's own account is done by a session, never by a program's token. */
  atPage?: true
  limit: LimitName
  params?: z.ZodObject
  query?: z.ZodObject
  body?: z.ZodObject | z.ZodDiscriminatedUnion
  /** A request sent twice under one Idempotency-Key is carried out once. */
  idempotent?: boolean
  status: 200 | 201 | 202 | 204 | 303
  /** Absent where the answer is empty or a file. */
  answer?: z.ZodType
  media?: 'image/png' | 'application/pdf' | 'model/gltf-binary' | 'text/csv'
  /** Problems beside those that follow from the above: status and when. */
  problems?: Partial<Record<401 | 403 | 404 | 409 | 503, string>>
}

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined

export type ParamsOf<O extends OperationContract> = Parsed<O['params']>
export type QueryOf<O extends OperationContract> = Parsed<O['query']>
export type BodyOf<O extends OperationContract> = Parsed<O['body']>
export type AnswerOf<O extends OperationContract> = O['answer'] extends z.ZodType
  ? z.input<O['answer']>
  : void

/** Keeps the exact types of a contract while checking its form. */
export const operation = <const O extends OperationContract>(contract: O) => contract
