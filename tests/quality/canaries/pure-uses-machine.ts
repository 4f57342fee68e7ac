// at: lib/units/canary.ts
// breaks: no-restricted-globals
export const home = () => process.env.HOME
