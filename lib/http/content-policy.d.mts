export function contentPolicy(frames?: readonly string[]): string
