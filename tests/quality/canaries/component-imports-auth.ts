// at: components/bench/canary.tsx
// breaks: boundaries/dependencies
export * from '@/lib/auth/tokens'
