// at: components/notes/canary.tsx
// breaks: boundaries/dependencies
export * from '@/components/bench/firing-strip'
