// at: app/canary.tsx
// breaks: boundaries/dependencies
export * from '@/db/client'
