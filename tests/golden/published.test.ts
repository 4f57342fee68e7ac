import { describe, expect, it } from 'vitest'
import { check, title } from '@/tests/support/mechanics/published/entry'
import { topics } from '@/tests/support/mechanics/published/topics'

/**
 * The kernel against figures from outside the project: `exact` to 1e-6, `expected` within the entry's own tolerance.
 * Each title names the source and whether its figures are published, common practice or from memory.
 */
describe.each(Object.entries(topics))('published figures: %s', (_topic, cases) => {
  it.each(Object.keys(cases).map((id) => [title(id), id]))('%s', (_title, id) => {
    expect.hasAssertions()
    check(id, cases[id])
  })
})
