// at: scene/webgl/canary.tsx
// breaks: boundaries/dependencies
export type { Clock } from '@/scene/session/clock'
