// at: scene/canvas/canary.ts
// breaks: boundaries/dependencies
export type { Train } from '@/lib/mechanics/train'
