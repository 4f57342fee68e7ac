// at: lib/mechanics/canary.ts
// breaks: boundaries/dependencies
export type { Scene } from '@/scene/model/scene'
