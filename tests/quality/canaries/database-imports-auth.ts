// at: db/canary.ts
// breaks: boundaries/dependencies
export * from '@/lib/auth/tokens'
