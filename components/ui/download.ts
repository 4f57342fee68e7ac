/** Hands a file to whoever sits there. */
export function download(name: string, content: Blob): void {
  const address = URL.createObjectURL(content)
  const link = document.createElement('a')
  link.href = address
  link.download = name
  link.click()
  URL.revokeObjectURL(address)
}

/** A title as the stem of a file's name: "Gas force, cylinder 1" becomes gas-force-cylinder-1. */
export const fileStem = (title: string): string =>
  title
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-|-$/g, '')
    .toLowerCase()
    .slice(0, 80) || 'scene'
