/** A file as an answer: kept nowhere, and named for whoever saves it. */
export const fileResponse = (bytes: Uint8Array<ArrayBuffer>, media: string, name: string): Response =>
  new Response(bytes, {
    headers: {
      'content-type': media,
      'content-disposition': `inline; filename="${name}"`,
      'cache-control': 'no-store',
    },
  })
