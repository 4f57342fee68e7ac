import { z } from 'zod'
import {
  createDocument,
  type ZodOpenApiOperationObject,
  type ZodOpenApiPathsObject,
  type ZodOpenApiResponsesObject,
} from 'zod-openapi'
import { allOperations } from '@/lib/contracts'
import { problemSchema } from '@/lib/contracts/common'
import { arriving } from '@/lib/contracts/documents'
import type { OperationContract } from '@/lib/contracts/operation'
import { saveConflictSchema } from '@/lib/contracts/scenes'
import { sessionCookieName } from '@/lib/auth/session-cookie-name'

const problem = (description: string, schema: z.ZodType = problemSchema) => ({
  description,
  content: { 'application/problem+json': { schema } },
})

/** The problems an operation can answer, from what it reads and whom it is for. */
function problemsOf(operation: OperationContract): ZodOpenApiResponsesObject {
  const reads = operation.body !== undefined
  return {
    ...(reads && {
      400: problem('Not readable as JSON'),
      413: problem('Larger than 2 MB'),
      415: problem('Not marked as JSON'),
    }),
    ...((reads || operation.query) && { 422: problem('Refused, with the fields it is about') }),
    ...(operation.for === 'person' && { 401: problem('Not signed in'), 403: problem('Not allowed') }),
    ...(operation.method !== 'GET' && { 403: problem('Not allowed, or sent from another site') }),
    ...(operation.params && { 404: problem('Not here') }),
    ...(operation.idempotent && { 409: problem('The Idempotency-Key was used for another request') }),
    429: problem('Too many requests'),
    503: problem('Not ready'),
    ...Object.fromEntries(
      Object.entries(operation.problems ?? {}).map(([status, description]) => [status, problem(description)]),
    ),
    ...(operation.id === 'saveVersion' && {
      409: problem(operation.problems?.[409] ?? '', problemSchema.extend(saveConflictSchema.shape)),
    }),
  }
}

function describe(operation: OperationContract): ZodOpenApiOperationObject {
  const success = operation.answer
    ? { description: operation.summary, content: { 'application/json': { schema: operation.answer } } }
    : operation.media
      ? { description: operation.summary, content: { [operation.media]: {} } }
      : { description: operation.summary }
  return {
    operationId: operation.id,
    summary: operation.summary,
    security:
      operation.for === 'anyone'
        ? []
        : operation.atPage
          ? [{ session: [] }]
          : [{ session: [] }, { token: [] }],
    requestParams: {
      ...(operation.params && { path: operation.params }),
      ...(operation.query && { query: operation.query }),
      ...(operation.idempotent && {
        header: z.object({ 'Idempotency-Key': z.string().min(8).max(100).optional() }),
      }),
    },
    ...(operation.body && {
      requestBody: { required: true, content: { 'application/json': { schema: operation.body } } },
    }),
    responses: { [String(operation.status)]: success, ...problemsOf(operation) },
  }
}

/** The whole HTTP interface in OpenAPI 3.1, from the contracts its handlers parse with. */
export function openApiDocument() {
  const paths: ZodOpenApiPathsObject = {}
  for (const operation of allOperations) {
    paths[operation.path] = {
      ...paths[operation.path],
      [operation.method.toLowerCase()]: describe(operation),
    }
  }
  return createDocument({
    openapi: '3.1.0',
    info: {
      title: 'Counterthrow',
      version: '1',
      description:
        'Crank trains: described once, analysed, kept in versions and shared as links. Units are in the names.',
    },
    components: {
      schemas: Object.fromEntries(
        Object.entries(arriving).map(([id, schema]) => [id, schema.meta({ id, unusedIO: 'input' })]),
      ),
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: sessionCookieName, description: 'Set by signing in' },
        token: {
          type: 'http',
          scheme: 'bearer',
          description:
            'A token made under Account: acts for whoever made it in one workshop, as a role no greater than theirs. Beside it a cookie counts for nothing.',
        },
      },
    },
    paths,
  })
}
