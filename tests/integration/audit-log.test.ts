import { beforeEach, describe, expect, it } from 'vitest'
import type { AuditEntry } from '@/lib/contracts/audit-log'
import { call } from './support/call'
import { newMember, newOwner, type Someone } from './support/people'
import { useServer } from './support/server'

const server = useServer()

let owner: Someone
beforeEach(async () => {
  owner = await newOwner()
})

const ask = (query = '', kind = '', cookie = owner.cookie) =>
  call('GET', `/api/v1/workshops/${owner.workshopId}/audit-log${kind}${query}`, { cookie })
const list = async (query = '') => (await ask(query)).body as { entries: AuditEntry[]; next: number | null }
const rename = (name: string) =>
  call('PATCH', `/api/v1/workshops/${owner.workshopId}`, { cookie: owner.cookie, body: { name } })

describe('GET /workshops/{id}/audit-log', () => {
  it('says who did what and when, with what was before and after, newest first', async () => {
    await rename('Thornquay Crank & Bore')
    await rename('Larkspur Crankworks')
    const { entries, next } = await list('?operation=workshop.change')
    expect(entries.map(({ before, after }) => [before, after])).toMatchObject([
      [{ name: 'Thornquay Crank & Bore' }, { name: 'Larkspur Crankworks' }],
      [{}, { name: 'Thornquay Crank & Bore' }],
    ])
    expect(entries[0]).toMatchObject({
      actor: { id: owner.id, name: 'Tamsin Orrelby' },
      subject: `workshop:${owner.workshopId}`,
    })
    expect(next).toBeNull()
  })

  it('is cut into pages that together hold every entry once', async () => {
    for (const name of ['A', 'B', 'C', 'D', 'E']) await rename(name)
    const all = (await list()).entries.map(({ id }) => id)
    const paged: number[] = []
    let next: number | null = null
    do {
      const page = await list(`?limit=2${next === null ? '' : `&before=${next}`}`)
      paged.push(...page.entries.map(({ id }) => id))
      next = page.next
    } while (next !== null)
    expect(paged).toEqual(all)
    expect(paged.length).toBeGreaterThan(5)
  })

  it('is filtered by person, area, thing and time', async () => {
    const other = await newMember(server.sql, owner.workshopId, 'owner')
    await rename('Ours')
    const changed = await call('PATCH', `/api/v1/workshops/${owner.workshopId}`, {
      cookie: other.cookie,
      body: { name: 'Theirs' },
    })
    expect(changed.status).toBe(200)
    const by = async (query: string) =>
      (await list(query)).entries.filter(({ operation }) => operation === 'workshop.change').length
    expect(await by(`?actor=${other.id}`)).toBe(1)
    expect(await by('?operation=workshop')).toBe(2)
    expect(await by('?operation=works')).toBe(0)
    expect(await by(`?subject=workshop:${owner.workshopId}`)).toBe(2)
    expect(await by(`?from=${new Date(Date.now() + 60_000).toISOString()}`)).toBe(0)
    expect(await by(`?to=${new Date(Date.now() + 60_000).toISOString()}`)).toBe(2)
    expect((await ask('?operation=%25')).status).toBe(422)
  })

  it('shows nothing of another workshop, and strangers nothing at all', async () => {
    const elsewhere = await newOwner()
    expect((await ask('', '', elsewhere.cookie)).status).toBe(404)
    const { entries } = await list()
    const ours = await server.sql`select id from audit_log where workshop_id = ${owner.workshopId}`
    expect(entries.map(({ id }) => id).sort()).toEqual(ours.map(({ id }) => Number(id)).sort())
  })

  it('as files holds the same entries, oldest first, and no cell that a spreadsheet would run', async () => {
    await rename('=1+1')
    const { entries } = (await ask('', '.json')).body as { entries: AuditEntry[] }
    expect(entries).toEqual((await list('?limit=100')).entries.reverse())
    const csv = await ask('?operation=workshop.change', '.csv')
    expect(csv.headers.get('content-type')).toContain('text/csv')
    const [head, row] = (csv.body as string).split('\r\n')
    expect(head).toBe('Entry,At,Person,Person id,Operation,Subject,Before,After')
    expect(row).toContain(`Tamsin Orrelby,${owner.id},workshop.change,workshop:${owner.workshopId}`)
    for (const cell of (csv.body as string).split(/[,\r\n]+/)) expect(cell).not.toMatch(/^"?[=+@]/)
  })
})
