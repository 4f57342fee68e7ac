import { asProblem } from '@/lib/errors/as-problem'

/** The one error shape, RFC 9457. A fault of ours is written to the log, where it can be found. */
export function problemResponse(error: unknown, request: Request): Response {
  const problem = asProblem(error)
  if (problem.status >= 500) {
    console.error(`${request.method} ${new URL(request.url).pathname}:`, problem.cause ?? problem.message)
  }
  const headers = new Headers({ 'content-type': 'application/problem+json', 'cache-control': 'no-store' })
  if (problem.kind === 'not-signed-in') headers.set('www-authenticate', 'Bearer')
  if (problem.retryAfterSeconds) headers.set('retry-after', String(problem.retryAfterSeconds))
  return new Response(JSON.stringify(problem), { status: problem.status, headers })
}
