// at: scene/model/canary.ts
// breaks: no-restricted-globals, no-restricted-globals
export const width = () => window.innerWidth + document.body.clientWidth
