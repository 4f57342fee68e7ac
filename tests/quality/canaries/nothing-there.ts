// at: lib/mechanics/canary.ts
// breaks: boundaries/dependencies
export * from '@/lib/numerics/nothing-there'
