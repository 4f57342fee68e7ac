import { expect, it } from 'vitest'
import { call } from './support/call'
import { newLink, newScene } from './support/links'
import { anchorOn } from './support/notes'
import { newOwner } from './support/people'
import { useServer } from './support/server'

useServer({ RATE_LIMIT: 'on' })

it('a guest’s writing is limited: after a burst the answer is to wait, and nothing more is kept', async () => {
  const owner = await newOwner()
  const { token } = await newLink(owner, await newScene(owner), { kind: 'note' })
  const anchor = anchorOn('single-450', 'piston:1')
  const send = () =>
    call('POST', `/api/v1/shared/${token}/notes`, { body: { name: 'Delphine', anchor, words: 'Again' } })
  const answers = []
  for (let turn = 0; turn < 12; turn++) answers.push(await send())
  expect(answers.slice(0, 10).map(({ status }) => status)).toEqual(Array.from({ length: 10 }, () => 201))
  expect(answers[11].status).toBe(429)
  expect(Number(answers[11].headers.get('retry-after'))).toBeGreaterThan(0)
  const made = answers.filter(({ status }) => status === 201).length
  const { notes } = (await call('GET', `/api/v1/shared/${token}/notes`)).body as { notes: unknown[] }
  expect(notes).toHaveLength(made)
})
