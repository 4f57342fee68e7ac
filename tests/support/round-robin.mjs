import { once } from 'node:events'
import { Agent, createServer, request } from 'node:http'

/** A loopback address behind which these servers answer in turn, as behind a balancer; `counts` says who how often. */
export async function startRoundRobin(addresses) {
  // a kept connection may be closed by its server just as the next request is sent on it
  const agent = new Agent({ keepAlive: false })
  const counts = addresses.map(() => 0)
  let turn = 0
  const server = createServer((asked, answer) => {
    const index = turn++ % addresses.length
    counts[index]++
    const { hostname, port } = new URL(addresses[index])
    const { method, url: path, headers } = asked
    const onward = request({ agent, hostname, port, method, path, headers }, (answered) => {
      answer.writeHead(answered.statusCode, answered.rawHeaders)
      answered.pipe(answer)
    })
    onward.on('error', () => answer.destroy())
    answer.on('close', () => onward.destroy())
    asked.pipe(onward)
  })
  server.listen(0, '127.0.0.1')
  await once(server, 'listening')
  return {
    address: `http://127.0.0.1:${server.address().port}`,
    counts,
    stop() {
      agent.destroy()
      server.closeAllConnections()
      server.close()
    },
  }
}
