// at: lib/units/canary.ts
// breaks: boundaries/dependencies
export { readFileSync } from 'node:fs'
