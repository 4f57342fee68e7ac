// at: scene/stage/canary.ts
// breaks: boundaries/dependencies
export { Dialog } from '@/components/ui/dialog'
