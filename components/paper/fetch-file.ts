import { Refusal } from '@/lib/contracts/call'

/** A file that the server makes of what is sent; what it says against it is thrown as a refusal. */
export async function fetchFile(
  path: `/api/v1/${string}`,
  body: unknown,
  signal?: AbortSignal,
): Promise<Blob> {
  const response = await fetch(path, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
    signal,
  }).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw new Refusal(0, {
      detail: 'The server cannot be reached.',
      cure: 'Check the connection and try again; nothing on the bench is lost.',
    })
  })
  if (response.ok) return response.blob()
  const problem = await response.json().catch(() => null)
  throw new Refusal(
    response.status,
    problem?.detail
      ? problem
      : { detail: 'The server did not answer as it should.', cure: 'Try again in a minute.' },
  )
}
