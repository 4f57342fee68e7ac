import { describe, expect, it } from 'vitest'
import { changedWords } from '@/components/audit/changed-words'

describe('changedWords(before, after)', () => {
  it('says what is other, what is new and what is gone, and is silent about what stayed', () => {
    const before = { role: 'designer', name: 'A', endsAt: null, label: 'x' }
    const after = { role: 'reviewer', name: 'A', endsAt: '2026-12-31', version: 3 }
    expect(changedWords(before, after)).toEqual([
      'role: designer → reviewer',
      'endsAt: none → 2026-12-31',
      'label was x',
      'version: 3',
    ])
  })

  it.each([
    [null, null, []],
    [null, { name: 'B' }, ['name: B']],
    [{ items: [1, 2] }, { items: [1, 2] }, []],
    [{ items: [1, 2] }, { items: [1] }, ['items: [1,2] → [1]']],
    ['a', 'b', ['value: a → b']],
  ])('changedWords(%j, %j)', (before, after, words) => {
    expect(changedWords(before, after)).toEqual(words)
  })
})
