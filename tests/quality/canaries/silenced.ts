// at: lib/units/canary.ts
// breaks: @typescript-eslint/ban-ts-comment, @typescript-eslint/no-explicit-any, comment, no-restricted-properties, no-warning-comments, no-warning-comments
// eslint-disable-next-line no-restricted-properties
export const chance = Math.random()
// @ts-ignore
export const loose: any = 1 // TODO
