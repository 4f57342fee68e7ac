// at: scene/model/canary.ts
// breaks: boundaries/dependencies
export type { Rig } from '@/scene/frame/types'
