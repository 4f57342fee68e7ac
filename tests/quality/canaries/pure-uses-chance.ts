// at: lib/mechanics/canary.ts
// breaks: no-restricted-properties
export const chance = () => Math.random()
