// at: tests/unit/canary.test.ts
// breaks: no-restricted-syntax
import { it } from 'vitest'
it.skip('is never run', () => {})
