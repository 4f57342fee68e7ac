import { describe, expect, it } from 'vitest'
import { bodyOf, draftOf, endInWords, endsFor, newDraft } from '@/components/sharing/link-draft'
import { frameHtml } from '@/lib/contracts/frame-html'
import type { ShareLink } from '@/lib/contracts/share-links'

const now = Date.parse('2026-03-01T12:00:00Z')
const link: ShareLink = {
  ...{ id: '01900000-0000-7000-8000-000000000001', sceneId: '01900000-0000-7000-8000-000000000002' },
  ...{ label: 'For Delphine', kind: 'note', version: 4, state: 'live', endsAt: '2026-03-04T12:00:00.000Z' },
  ...{ locked: true, frameOrigins: ['https://a.example', 'https://b.example'], revokedAt: null, opened: 3 },
  ...{ lastOpenedAt: null, questions: 0, createdBy: 'Fenn', createdAt: '2026-02-20T12:00:00.000Z' },
}

describe('endInWords(link, now)', () => {
  it.each([
    ['2026-03-04T12:00:00Z', 'ends in 3 days'],
    ['2026-03-02T12:00:00Z', 'ends in 24 hours'],
    ['2026-03-01T12:20:00Z', 'ends in 1 hour'],
    [null, 'open until withdrawn'],
  ])('%s is "%s"', (endsAt, words) => {
    expect(endInWords({ state: 'live', endsAt }, now)).toBe(words)
  })

  it('an ended and a withdrawn link say so, whatever their end', () => {
    for (const state of ['ended', 'withdrawn'] as const)
      expect(endInWords({ state, endsAt: '2026-03-04T12:00:00Z' }, now)).toBe(state)
  })
})

describe('bodyOf(draft, version, now)', () => {
  it('a new draft looks, follows the latest version and ends in 30 days', () => {
    expect(bodyOf(newDraft(), 6, now)).toEqual({
      ...{ label: '', kind: 'look', version: null, endsAt: '2026-03-31T12:00:00.000Z' },
      ...{ password: null, frameOrigins: [] },
    })
  })

  it('the fields of a link that nobody touched change nothing of its end and password', () => {
    const body = bodyOf(draftOf(link), 4, now)
    expect(body).toMatchObject({
      label: 'For Delphine',
      kind: 'note',
      version: 4,
      frameOrigins: link.frameOrigins,
    })
    expect(body.endsAt).toBeUndefined()
    expect(body.password).toBeUndefined()
  })

  it('sites are taken apart at line ends, spaces and commas', () => {
    const origins = ' https://a.example\nhttps://b.example, https://c.example '
    expect(bodyOf({ ...newDraft(), origins }, 1, now).frameOrigins).toHaveLength(3)
  })

  it('a chosen day lasts until its end', () => {
    const { endsAt } = bodyOf({ ...newDraft(), ends: 'day', day: '2026-05-06' }, 1, now)
    const end = new Date(endsAt ?? '')
    expect([end.getDate(), end.getHours(), end.getMinutes()]).toEqual([6, 23, 59])
  })
})

describe('endsFor(may, changing)', () => {
  it('offers "not until withdrawn" to whom the table gives it, and "as it is" to a link that is there', () => {
    expect(endsFor([], false)).toEqual(['1', '7', '30', '90', 'day'])
    expect(endsFor(['link.endless'], true)).toEqual(['1', '7', '30', '90', 'day', 'none', 'kept'])
  })
})

describe('frameHtml(page, title, width, height)', () => {
  it('leads to the framed page, and a title cannot end its attribute', () => {
    const html = frameHtml('https://c.example/s/abc', '"><script>', 900, 600)
    expect(html).toContain('src="https://c.example/embed/abc"')
    expect(html).not.toContain('<script>')
  })
})
