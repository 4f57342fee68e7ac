// at: scene/stage/canary.ts
// breaks: boundaries/dependencies, boundaries/dependencies
export { Vector3 } from 'three'
export { Canvas } from '@react-three/fiber'
