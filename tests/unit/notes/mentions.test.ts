import { describe, expect, it } from 'vitest'
import { matching, mentionAt, mentionedIn } from '@/components/notes/mentions'

const people = [
  { id: 'a', name: 'Ysolde Karrowby', role: 'designer' },
  { id: 'b', name: 'Ines Quillmarsh', role: 'reviewer' },
  { id: 'c', name: 'Zoé Ångström', role: 'sales' },
]

describe('mentionAt(text, caret)', () => {
  it('finds the name being typed at the caret', () => {
    expect(mentionAt('Look, @Yso', 10)).toEqual({ from: 6, typed: 'Yso' })
    expect(mentionAt('@', 1)).toEqual({ from: 0, typed: '' })
    expect(mentionAt('@Ysolde Karr and more', 12)).toEqual({ from: 0, typed: 'Ysolde Karr' })
  })
  it('takes a mail address, a finished line and other signs for plain words', () => {
    expect(mentionAt('write to a@b', 12)).toBeNull()
    expect(mentionAt('@Ysolde\nthen', 12)).toBeNull()
    expect(mentionAt('@1', 2)).toBeNull()
    expect(mentionAt('no sign', 7)).toBeNull()
  })
})

describe('matching(people, typed)', () => {
  it('begins at any word of a name, without regard to accents and capitals', () => {
    expect(matching(people, 'karr').map(({ id }) => id)).toEqual(['a'])
    expect(matching(people, 'zoe a').map(({ id }) => id)).toEqual(['c'])
    expect(matching(people, 'angs').map(({ id }) => id)).toEqual(['c'])
    expect(matching(people, '')).toHaveLength(3)
    expect(matching(people, 'x')).toEqual([])
  })
})

describe('mentionedIn(words, people)', () => {
  it('names those whose whole name follows an @', () => {
    expect(mentionedIn('@Ines Quillmarsh, and @Ysolde too; Zoé Ångström not', people)).toEqual(['b'])
  })
})
