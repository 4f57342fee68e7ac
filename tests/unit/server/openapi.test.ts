import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { Validator } from '@seriousme/openapi-schema-validator'
import { describe, expect, it } from 'vitest'
import { allOperations } from '@/lib/contracts'
import { openApiDocument } from '@/lib/http/openapi'

const root = 'app/api/v1'
const files = readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((file) =>
  file.endsWith('route.ts'),
)
const pathOf = (file: string) =>
  join('/api/v1', file.replace(/\/?route\.ts$/, ''))
    .replaceAll('[', '{')
    .replaceAll(']', '}')

const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE']

describe('openApiDocument()', () => {
  const document = openApiDocument()

  it('openApiDocument() is valid OpenAPI 3.1', async () => {
    const result = await new Validator().validate(JSON.parse(JSON.stringify(document)))
    expect(result.errors ?? []).toEqual([])
    expect(result.valid).toBe(true)
    expect(document.openapi).toBe('3.1.0')
  })

  it('openApiDocument() describes exactly the methods that the route files export', async () => {
    const exported = await Promise.all(
      files.map(async (file) => {
        const module = (await import(join(process.cwd(), root, file))) as Record<string, unknown>
        return methods.filter((method) => method in module).map((method) => `${method} ${pathOf(file)}`)
      }),
    )
    const described = Object.entries(document.paths ?? {}).flatMap(([path, item]) =>
      Object.keys(item).map((method) => `${method.toUpperCase()} ${path}`),
    )
    expect(described.sort()).toEqual(exported.flat().sort())
  })

  it('openApiDocument() says how each call is opened: not at all, by a session alone, or by a token too', () => {
    expect(document.components?.securitySchemes?.token).toMatchObject({ type: 'http', scheme: 'bearer' })
    for (const operation of allOperations) {
      const item = document.paths?.[operation.path] as Record<string, { security?: unknown }>
      const byPerson = operation.atPage ? [{ session: [] }] : [{ session: [] }, { token: [] }]
      const expected = operation.for === 'anyone' ? [] : byPerson
      expect(item[operation.method.toLowerCase()].security, operation.id).toEqual(expected)
    }
  })

  it('openApiDocument() has no reference that leads nowhere', () => {
    const text = JSON.stringify(document)
    const names = [...text.matchAll(/"#\/components\/schemas\/([^"]+)"/g)].map(([, name]) => name)
    expect(names.length).toBeGreaterThan(10)
    for (const name of names) expect(Object.keys(document.components?.schemas ?? {})).toContain(name)
  })

  it('every operation has an id of its own', () => {
    expect(new Set(allOperations.map(({ id }) => id)).size).toBe(allOperations.length)
  })
})
