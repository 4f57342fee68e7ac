import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('../..', import.meta.url))
const support = `${root}tests/support/`

const project = (name: string, more: object = {}) => ({
  extends: true as const,
  test: { name, include: [`tests/${name}/**/*.test.{ts,tsx}`], ...more },
})

/** Tests of pure code may share the modules that they load: loading them took as long as half the tests. */
const shared = { isolate: false }
/** What measures the heap wants a process to itself. */
const alone = 'tests/unit/**/*.alone.test.ts'
/** What starts and kills whole servers wants a machine to itself. */
const servers = 'tests/integration/server/**/*.test.ts'

export default defineConfig({
  root,
  cacheDir: `${root}node_modules/.vitest`,
  resolve: {
    alias: [
      { find: /^@\//, replacement: root },
      // outside a server bundle its only content is an error
      { find: /^server-only$/, replacement: `${support}empty.ts` },
    ],
  },
  test: {
    environment: 'node',
    testTimeout: 30_000,
    hookTimeout: 60_000,
    projects: [
      project('unit', { ...shared, exclude: [alone] }),
      project('alone', { include: [alone] }),
      project('bench', { include: [], benchmark: { include: ['tests/bench/**/*.bench.ts'] } }),
      project('golden', shared),
      project('rendering', shared),
      project('integration', { exclude: [servers], globalSetup: `${support}cluster.mjs` }),
      project('servers', { include: [servers], globalSetup: `${support}cluster.mjs` }),
    ],
  },
})
