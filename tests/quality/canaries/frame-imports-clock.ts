// at: scene/frame/canary.ts
// breaks: boundaries/dependencies
export { createClock } from '@/scene/session/clock'
