import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { newDraft } from '@/components/sharing/link-draft'
import { LinkFields } from '@/components/sharing/link-fields'
import { LinkTable } from '@/components/sharing/link-table'
import { PasswordSheet } from '@/components/sharing/password-sheet'
import type { Operation } from '@/lib/auth/access'
import type { ShareLink } from '@/lib/contracts/share-links'

const fields = (
  may: Operation[],
  issues: { path: string; code: string; message: string; fix: string }[] = [],
) =>
  renderToStaticMarkup(
    <LinkFields {...{ may, issues }} draft={newDraft()} version={4} changing={false} onChange={() => {}} />,
  )

describe('<LinkFields/>', () => {
  it('offers a link without an end only to whom the table gives it', () => {
    expect(fields([])).not.toContain('not until withdrawn')
    expect(fields(['link.endless'])).toContain('not until withdrawn')
  })

  it('says a refusal at the field it is about, with its mend', () => {
    const html = fields(
      [],
      [{ path: 'frameOrigins.1', code: 'custom', message: 'No site.', fix: 'Give one.' }],
    )
    const [, said] = /<textarea[^>]*aria-describedby="([^"]+)"/.exec(html) ?? []
    expect(html).toContain(`id="${said}">No site. Give one.`)
  })
})

describe('<LinkTable/>', () => {
  const link: ShareLink = {
    ...{
      id: 'a',
      sceneId: 's',
      label: '',
      kind: 'decide',
      version: 4,
      state: 'live',
      endsAt: null,
      locked: true,
    },
    ...{ frameOrigins: ['https://a.example'], revokedAt: null, opened: 7, lastOpenedAt: null, questions: 2 },
    ...{ createdBy: 'Fenn', createdAt: '2026-02-20T12:00:00.000Z' },
  }

  it('says what a link lets, and offers to withdraw only what is live, to whom may', () => {
    const withdrawn = { ...link, id: 'b', state: 'withdrawn' as const }
    const html = renderToStaticMarkup(<LinkTable links={[link, withdrawn]} onWithdraw={() => {}} />)
    expect(html).toContain('decide, password, framed')
    expect(html).toContain('open until withdrawn')
    expect(html.match(/<button/g)).toHaveLength(1)
    expect(renderToStaticMarkup(<LinkTable links={[link]} />)).not.toContain('<button')
  })
})

describe('<PasswordSheet/>', () => {
  it('is a plain form that says nothing but that a password is wanted, and why the last one was not taken', () => {
    const html = renderToStaticMarkup(<PasswordSheet action="/s/t/pass" said="wrong" />)
    expect(html).toContain('action="/s/t/pass" method="post"')
    expect(html).toContain('This is not the password.')
    for (const odd of ['<script>', 'constructor']) {
      const shown = renderToStaticMarkup(<PasswordSheet action="/s/t/pass" said={odd} />)
      expect(shown).not.toContain(odd)
      expect(shown).not.toContain('role="alert"')
    }
  })
})
