// at: lib/numerics/canary.ts
// breaks: boundaries/dependencies
export { derivative } from 'mathjs'
