// at: scene/canvas/canary.ts
// breaks: boundaries/dependencies
export const other = () => import('@/scene/webgl/create-webgl-renderer')
