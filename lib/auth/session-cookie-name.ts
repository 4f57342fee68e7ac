export const sessionCookieName = 'counterthrow_session'
