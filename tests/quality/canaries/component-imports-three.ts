// at: components/bench/canary.tsx
// breaks: boundaries/dependencies
export { Vector3 } from 'three'
