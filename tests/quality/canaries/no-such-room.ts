// at: lib/elsewhere/canary.ts
// breaks: boundaries/no-unknown-files
export const lost = true
