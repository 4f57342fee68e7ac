// at: scene/frame/canary.ts
// breaks: boundaries/dependencies
export { Vector3 } from 'three'
