/** Back to where somebody came from, if that is a page of ours; else where they are to go. */
export const ownPage = (wanted: unknown, otherwise: string) =>
  typeof wanted === 'string' && /^\/(?![/\\])/.test(wanted) ? wanted : otherwise
