// at: lib/mechanics/canary.ts
// breaks: no-restricted-globals, no-restricted-globals
export const now = () => new Date().getTime() + performance.now()
