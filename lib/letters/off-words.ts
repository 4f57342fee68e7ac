/** What stands before the address where a kind of mail is turned off. */
export const offWords = 'Turn these mails off'
