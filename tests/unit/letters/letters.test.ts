import { describe, expect, it } from 'vitest'
import { dayWords } from '@/lib/letters/day-words'
import { letterNames, type LetterData, type LetterName } from '@/lib/letters/letter-data'
import { letterWords } from '@/lib/letters/letter-words'
import { kindOf, mailKinds } from '@/lib/letters/mail-kinds'
import { writeLetter } from '@/lib/letters/write-letter'

const url = 'https://counterthrow.example/x?a=1&b=2'
const review = { scene: '90° V8 5.0 L', version: 4, url }
const samples: LetterData = {
  invitation: {
    ...{ workshop: 'Larkspur Crankworks', role: 'designer', inviter: 'Odo Larkspur', url },
    endsAt: '2026-12-08T09:30:00.000Z',
  },
  'password-reset': { name: 'Ysolde Karrowby', url, minutes: 60 },
  'review-asked': {
    ...review,
    asker: 'Ysolde Karrowby',
    due: '2026-12-04',
    message: 'Look at web 4.\n<b>soon</b>',
  },
  'review-answered': {
    ...review,
    person: 'Ines Quillmarsh',
    word: 'approved',
    sentence: 'Radius is right now.',
  },
  'review-reminder': { ...review, asker: 'Ysolde Karrowby', due: '2026-12-04' },
  question: {
    ...{ scene: '90° V8 5.0 L', visitor: 'Delphine Astercroft', email: 'delphine@example.com' },
    ...{ question: 'Would a flat plane be better?', step: 'at 90°', url },
  },
  'question-copy': { workshop: 'Larkspur Crankworks', question: 'Would a flat plane be better?' },
  'mention-digest': {
    mentions: [
      { scene: '90° V8 5.0 L', number: 2, by: 'Ines Quillmarsh', words: 'Is this "enough"?', url },
      { scene: '45° twin', number: 7, by: 'Odo Larkspur', words: 'Your word on this', url },
    ],
  },
  link: {
    ...{ sender: 'Fenn Ostravale', workshop: 'Larkspur Crankworks' },
    scene: 'V8',
    message: 'Here it is.',
    url,
  },
}
const unsubscribe = { pageUrl: `${url}&page`, postUrl: `${url}&post` }
const write = (name: LetterName, off: typeof unsubscribe | null = null, data: unknown = samples[name]) =>
  writeLetter(name, data, { name: 'Joric Ambleforth', unsubscribe: off })

/** What a reader of the HTML sees, as text, and the addresses behind its links in their order. */
function seen(html: string) {
  const plain = (text: string) =>
    text
      .replace(/<[^>]*>/g, '')
      .replaceAll('&lt;', '<')
      .replaceAll('&gt;', '>')
      .replaceAll('&quot;', '"')
      .replaceAll('&#39;', "'")
      .replaceAll('&amp;', '&')
  const body = html.slice(html.indexOf('<body'))
  return {
    words: plain(body.replaceAll('<br>', '\n')),
    links: [...body.matchAll(/href="([^"]*)"/g)].map(([, address]) => plain(address)),
  }
}
const squeeze = (text: string) => text.replace(/\s+/g, ' ').trim()

describe.each(letterNames)('the letter %s', (name) => {
  const letter = write(name, kindOf(name) ? unsubscribe : null)

  it('says the same in text and HTML, word for word and link for link', () => {
    const { words, links } = seen(letter.html)
    const addresses = [...letter.text.matchAll(/^https?:\/\/\S+$/gm)].map(([address]) => address)
    expect(links).toEqual(addresses)
    const spoken = letter.text
      .replace(/:\n+https?:\/\/\S+/g, '')
      .replace(/^> ?/gm, '')
      .replace(/^-- $/m, '')
    expect(squeeze(words)).toBe(squeeze(spoken))
  })

  it('has one line for a subject, a name in lists, and a reason why one gets it', () => {
    expect(letter.subject).toMatch(/^[^\r\n]{4,}$/)
    expect(letterWords[name]).not.toBe('')
    expect(letter.text.split('\n-- \n')[1]).toMatch(
      /^(You get this because|Counterthrow sent this|\S+ \S+ of .* sent you)/,
    )
  })

  it('fetches nothing, runs nothing and paints nothing that a dark page would hide', () => {
    expect(letter.html).not.toMatch(/<(img|script|link|iframe|object|form)\b|url\(|\bsrc=|@import/i)
    expect(letter.html).not.toMatch(/#[0-9a-f]{3,8}\b(?!;)|\b(color|background)(-color)?:(?!.*currentColor)/i)
    expect(letter.html).toContain('<meta name="color-scheme" content="light dark">')
    expect(letter.html).toMatch(/<html lang="en">/)
  })

  it('uses the words of the product', () => {
    const said = `${letter.subject}\n${letter.text}`
    expect(said).not.toMatch(/\b(invalid|oops|please|successfully|dashboard|workspace|project)\b/i)
  })

  it('can be turned off by one click exactly if it is of a kind that can', () => {
    if (kindOf(name)) {
      expect(letter.headers).toEqual({
        'List-Unsubscribe': `<${unsubscribe.postUrl}>`,
        'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
      })
      expect(letter.text).toContain(unsubscribe.pageUrl)
    } else {
      expect(letter.headers).toEqual({})
      expect(letter.text).not.toMatch(/turn these mails off/i)
    }
  })
})

describe('writeLetter()', () => {
  it('every kind of mail that can be turned off has a letter', () => {
    expect(new Set(letterNames.flatMap((name) => kindOf(name) ?? []))).toEqual(new Set(mailKinds))
  })

  it('somebody’s own words are text, never markup', () => {
    const { html } = write('review-asked')
    expect(html).toContain('&lt;b&gt;soon&lt;/b&gt;')
    expect(html).not.toContain('<b>')
    const title = '"><script>alert(1)</script>'
    expect(write('review-asked', null, { ...samples['review-asked'], scene: title }).html).not.toContain(
      '<script',
    )
  })

  it('a subject with a line break in what it names stays one line', () => {
    const { subject } = write('question', null, { ...samples.question, scene: 'V8\r\nBcc: all@example.com' })
    expect(subject).toBe('A question about V8 Bcc: all@example.com')
  })

  it('an answer to a question goes to whoever asked', () => {
    expect(write('question').replyTo).toBe('delphine@example.com')
    expect(write('review-asked').replyTo).toBeUndefined()
  })

  it('refuses what a letter cannot be made of', () => {
    expect(() =>
      write('review-asked', null, { ...samples['review-asked'], url: 'javascript:alert(1)' }),
    ).toThrow()
    expect(() => write('mention-digest', null, { mentions: [] })).toThrow()
  })
})

describe('dayWords()', () => {
  it.each([
    ['2026-12-04', '4 December 2026'],
    ['2026-12-08T09:30:00.000Z', '8 December 2026, 09:30 UTC'],
    ['2026-13-08', '2026-13-08'],
    ['on Friday', 'on Friday'],
  ])('dayWords(%s) is %s', (iso, expected) => {
    expect(dayWords(iso)).toBe(expected)
  })
})
