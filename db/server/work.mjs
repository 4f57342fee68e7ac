import { once } from 'node:events'
import { bundleWorker, workerProgram } from './bundle.mjs'
import { Refusal, startGroup } from './processes.mjs'

/** Carries out the jobs of the queue in a process of its own, and comes back when it works. */
export async function work({ root, distDir, environment }) {
  const env = { ...process.env, NODE_ENV: 'production', ...environment }
  const stdio = ['ignore', 'inherit', 'inherit', 'ipc']
  const worker = startGroup(process.execPath, [workerProgram(root, distDir)], { cwd: root, env, stdio })
  const works = once(worker.child, 'message').then(() => true)
  if (await Promise.race([works, worker.ended.then(() => false)])) return worker
  throw new Refusal('The worker ended before it worked; see above.')
}

/** The same from the sources as they are, anew whenever they change. */
export async function workAsWritten({ root, distDir, environment }) {
  const place = `${distDir}/as-written`
  let worker
  let turn = Promise.resolve()
  const renew = async () => {
    await worker?.stop()
    worker = await work({ root, distDir: place, environment }).catch((error) => console.error(error.message))
  }
  await bundleWorker(root, place, () => (turn = turn.then(renew)))
  return { ended: new Promise(() => {}) }
}
