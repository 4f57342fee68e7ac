/** Names in a row: hyphens, commas or spaces between. */
export const splitNames = (text: string) =>
  text
    .split(/[\s,;\u2013\u2212-]+/)
    .map((name) => name.trim())
    .filter(Boolean)
