export const width = () => document.body.clientWidth
export const home = () => process.env.HOME
