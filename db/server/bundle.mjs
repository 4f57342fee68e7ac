import { join } from 'node:path'

/** Where the worker's program lies, beside the pages that were built with it. */
export const workerProgram = (root, distDir) => join(root, distDir, 'worker', 'worker.mjs')

/**
 * Puts the worker and the services it calls into one file, so that a start needs no tool. Packages stay outside.
 * With `watch` it is made anew when a source changes, and `watch` is told.
 */
export async function bundleWorker(root, distDir, watch) {
  const { build } = await import('vite')
  const result = await build({
    root,
    configFile: false,
    logLevel: 'error',
    publicDir: false,
    resolve: {
      alias: [
        { find: /^@\//, replacement: `${root}/` },
        // outside a server bundle its only content is an error
        { find: /^server-only$/, replacement: `${root}/node_modules/server-only/empty.js` },
      ],
    },
    build: {
      ssr: join(root, 'lib/tasks/worker.ts'),
      target: 'node20',
      outDir: join(root, distDir, 'worker'),
      emptyOutDir: true,
      watch: watch ? { buildDelay: 1000 } : null,
      rolldownOptions: { output: { entryFileNames: 'worker.mjs' } },
    },
  })
  if (!watch) return
  result.on('event', ({ code, error }) => {
    if (code === 'BUNDLE_END') watch()
    if (code === 'ERROR') console.error(`The worker stays as it was: ${error.message}`)
  })
}
