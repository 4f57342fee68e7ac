// at: lib/mechanics/canary.ts
// breaks: boundaries/dependencies
export * from '@/db/client'
