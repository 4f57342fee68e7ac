// at: lib/errors/canary.ts
// breaks: boundaries/dependencies
export * from '@/lib/config/index'
