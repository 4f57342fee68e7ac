const months = [
  ...['January', 'February', 'March', 'April', 'May', 'June'],
  ...['July', 'August', 'September', 'October', 'November', 'December'],
]

/** "4 December 2026" of an ISO day, with ", 14:05 UTC" where a time of day is given; anything else as it stands. */
export function dayWords(iso: string): string {
  const found = /^(\d{4})-(\d{2})-(\d{2})(?:T(\d{2}:\d{2})[\d:.]*Z)?$/.exec(iso)
  const month = months[Number(found?.[2]) - 1]
  if (!found || !month) return iso
  const day = `${Number(found[3])} ${month} ${found[1]}`
  return found[4] ? `${day}, ${found[4]} UTC` : day
}
