/** Places that the server leaves free for what needs scripts. */
export const deskPlaces = { actions: 'guest-actions', ends: 'guest-ends' } as const
