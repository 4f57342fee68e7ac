import { nextEnvironment, nextProgram } from './build.mjs'
import { Refusal, portIsFree, startGroup, until } from './processes.mjs'

export async function ensurePort(port) {
  if (await portIsFree(port)) return
  throw new Refusal(`Port ${port} is taken by another program. Choose one: PORT=${port + 1} npm start`)
}

/** Serves the program on 127.0.0.1 and comes back when it answers that it is healthy. */
export async function serve({ root, port, distDir, dev = false, environment }) {
  const args = [nextProgram(root), dev ? 'dev' : 'start', '-H', '127.0.0.1', '-p', String(port)]
  const env = nextEnvironment(distDir, { NODE_ENV: dev ? 'development' : 'production', ...environment })
  const server = startGroup(process.execPath, args, { cwd: root, env })
  const address = `http://127.0.0.1:${port}`
  let over = false
  void server.ended.then(() => (over = true))
  let last = ''
  const answer = await until(
    async () => {
      if (over) return 'over'
      try {
        const response = await fetch(`${address}/api/v1/health`, { signal: AbortSignal.timeout(30_000) })
        if (response.ok) return 'healthy'
        last = `${response.status} ${await response.text()}`.slice(0, 500)
      } catch (error) {
        last = String(error.cause ?? error)
      }
      return null
    },
    300_000,
    100,
  )
  if (answer === 'over') throw new Refusal('The web server ended before it answered.')
  if (!answer) throw new Refusal(`The web server is not healthy after five minutes: ${last}`)
  return { address, pid: server.pid, ended: server.ended, stop: server.stop }
}
