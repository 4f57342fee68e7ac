const utc = { timeZone: 'UTC' } as const
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', ...utc })
const time = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', ...utc })

/** As the server writes a day, which does not know where its reader is. */
export const dayInWords = (iso: string) => day.format(new Date(iso))

export const timeInWords = (iso: string) => `${day.format(new Date(iso))}, ${time.format(new Date(iso))} UTC`
