// at: scene/frame/canary.ts
// breaks: boundaries/dependencies
export type { Stage } from '@/scene/stage/types'
