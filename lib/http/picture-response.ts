import { createHash } from 'node:crypto'

interface Picture {
  bytes: Uint8Array<ArrayBuffer>
  tag: string
}

const mostPictures = 400

// the latest used last; a picture that is being drawn is there already, so that nobody draws it twice
const pictures = new Map<string, Promise<Picture>>()

function pictureOf(key: string, draw: () => Promise<Uint8Array>): Promise<Picture> {
  const picture = pictures.get(key) ?? draw().then(withTag)
  pictures.delete(key)
  pictures.set(key, picture)
  picture.catch(() => pictures.delete(key))
  if (pictures.size > mostPictures) pictures.delete(pictures.keys().next().value as string)
  return picture
}

const withTag = (drawn: Uint8Array): Picture => ({
  bytes: Uint8Array.from(drawn),
  tag: `"${createHash('sha256').update(drawn).digest('base64url').slice(0, 22)}"`,
})

/**
 * A PNG drawn once for a key that names everything it shows. The browser may keep it but asks each time: whether it may
 * still see it has been settled before this.
 */
export async function pictureResponse(
  request: Request,
  key: string,
  draw: () => Promise<Uint8Array>,
): Promise<Response> {
  const { bytes, tag } = await pictureOf(key, draw)
  const headers = { etag: tag, 'cache-control': 'private, no-cache' }
  if (request.headers.get('if-none-match') === tag) return new Response(null, { status: 304, headers })
  return new Response(bytes, { headers: { ...headers, 'content-type': 'image/png' } })
}
