/** The whole page is loaded again, so that every part of it knows the person and their workshop. */
export const goTo = (address: string) => window.location.assign(address)
