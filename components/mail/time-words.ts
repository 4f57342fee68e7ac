const time = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short', timeZone: 'UTC' })

/** The same on the server and in the page, whose zones may differ. */
export const timeWords = (iso: string) => `${time.format(new Date(iso))} UTC`
