import { readdirSync } from 'node:fs'
import { join } from 'node:path'

const root = 'app/api/v1'
const routes = readdirSync(root, { recursive: true, encoding: 'utf8' })
  .filter((file) => file.endsWith('route.ts'))
  .map((file) => {
    const folder = `/api/v1/${file.replace(/\/?route\.ts$/, '')}`
    const names = [...folder.matchAll(/\[(\w+)\]/g)].map(([, name]) => name)
    const escaped = folder.replaceAll('.', '\\.').replace(/\[\w+\]/g, '([^/]+)')
    return { file, names, pattern: new RegExp(`^${escaped}$`) }
  })
  // a written-out step wins over a named one
  .sort((a, b) => a.names.length - b.names.length)

type Handler = (request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>

export interface Answer {
  status: number
  headers: Headers
  body: unknown
}

export interface Asked {
  cookie?: string
  body?: unknown
  /** Sent as it is, whatever it is. */
  raw?: BodyInit
  headers?: Record<string, string>
}

/** Calls the route handler of an address as the framework would. */
export async function call(method: string, address: string, asked: Asked = {}): Promise<Answer> {
  const response = await fetchRoute(method, address, asked)
  const text = await response.text()
  const json = response.headers.get('content-type')?.includes('json')
  return { status: response.status, headers: response.headers, body: json ? JSON.parse(text) : text }
}

export async function fetchRoute(method: string, address: string, asked: Asked = {}): Promise<Response> {
  const url = new URL(address, 'http://127.0.0.1:3000')
  const found = routes
    .map((route) => ({ route, match: route.pattern.exec(url.pathname) }))
    .find(({ match }) => match)
  if (!found?.match) throw new Error(`No route for ${url.pathname}`)
  const values = found.match.slice(1).map(decodeURIComponent)
  const params = Object.fromEntries(found.route.names.map((name, index) => [name, values[index]]))
  const module = (await import(join(process.cwd(), root, found.route.file))) as Record<string, Handler>
  const headers = new Headers({ host: '127.0.0.1:3000' })
  if (asked.cookie) headers.set('cookie', asked.cookie)
  if (asked.cookie && method !== 'GET') headers.set('sec-fetch-site', 'same-origin')
  const body = asked.raw ?? (asked.body === undefined ? undefined : JSON.stringify(asked.body))
  if (body !== undefined) headers.set('content-type', 'application/json')
  for (const [name, value] of Object.entries(asked.headers ?? {})) headers.set(name, value)
  return module[method](new Request(url, { method, headers, body }), { params: Promise.resolve(params) })
}
