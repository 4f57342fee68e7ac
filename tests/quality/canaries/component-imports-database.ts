// at: components/bench/canary.tsx
// breaks: boundaries/dependencies
export * from '@/db/client'
