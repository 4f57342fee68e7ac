// at: scene/frame/canary.ts
// breaks: boundaries/dependencies
export { useMemo } from 'react'
