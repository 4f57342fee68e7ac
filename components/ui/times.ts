const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' })
const minute = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
})
const zoned = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  timeZoneName: 'short',
})

/** In the reader's own zone; one that is a deadline also names the zone. */
export const dayOf = (iso: string) => day.format(new Date(iso))
export const minuteOf = (iso: string) => minute.format(new Date(iso))
export const deadlineOf = (iso: string) => zoned.format(new Date(iso))
