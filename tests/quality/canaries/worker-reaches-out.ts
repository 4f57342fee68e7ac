// at: scene/canvas/canary.ts
// breaks: boundaries/dependencies
export const worker = () => new Worker(new URL('../../lib/mechanics/train.ts', import.meta.url))
