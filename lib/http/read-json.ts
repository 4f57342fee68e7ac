import { Problem } from '@/lib/errors/problem'

export const mostBodyBytes = 2 * 1024 * 1024

const tooLarge = () =>
  new Problem(
    'too-large',
    'The request is larger than 2 MB.',
    'Send fewer trace points, or a smaller document.',
  )

export async function readBytes(request: Request): Promise<Uint8Array<ArrayBuffer>> {
  if (Number(request.headers.get('content-length') ?? 0) > mostBodyBytes) throw tooLarge()
  const chunks: Uint8Array[] = []
  let size = 0
  // the stated length may be absent or untrue
  for await (const chunk of request.body ?? []) {
    size += chunk.byteLength
    if (size > mostBodyBytes) throw tooLarge()
    chunks.push(chunk)
  }
  return Buffer.concat(chunks)
}

export async function readJson(request: Request): Promise<unknown> {
  const type = request.headers.get('content-type')?.split(';')[0].trim().toLowerCase()
  // also keeps out what a form on another site can send without asking
  if (type !== 'application/json') {
    throw new Problem(
      'wrong-type',
      'The request is not marked as JSON.',
      'Send it with Content-Type: application/json.',
    )
  }
  const bytes = await readBytes(request)
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes))
  } catch (cause) {
    const reason = cause instanceof Error ? cause.message : 'unknown'
    throw new Problem('unreadable', `The request is not JSON: ${reason}.`, 'Send one JSON object in UTF-8.', {
      cause,
    })
  }
}
