/** What is changed, and the code, paths and words of the refusal. */
export type Refusal = [
  name: string,
  preset: string,
  changes: Record<string, unknown>,
  code: string,
  paths: string[],
  says: string,
]

export const trace = (angleDeg: number[], pressureBar = angleDeg.map(() => 1)) => ({
  gas: { model: 'trace', angleDeg, pressureBar },
})
