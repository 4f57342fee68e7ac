import { createHash } from 'node:crypto'
import { canonicalJson } from '@/lib/review/canonical-json'

/** What a verdict is given on: this document as this version of this scene. The document as it is stored, not as it is read. */
export const verdictText = (scene: string, version: number, document: unknown) => ({
  format: 'verdict/1' as const,
  ...{ scene, version, document },
})

/** SHA-256 over the canonical text (RFC 8785) in UTF-8. */
export const hashOf = (value: unknown) =>
  createHash('sha256').update(canonicalJson(value), 'utf8').digest('hex')
