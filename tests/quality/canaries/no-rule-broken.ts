// at: scene/frame/canary.ts
// breaks:
export type { Train } from '@/lib/mechanics/train'
export type { Scene } from '@/scene/model/scene'
