// at: components/ui/canary.tsx
// breaks: boundaries/dependencies
export type { Scene } from '@/scene/model/scene'
