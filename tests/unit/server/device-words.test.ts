import { describe, expect, it } from 'vitest'
import { deviceWords } from '@/lib/services/device-words'

const webkit = 'AppleWebKit/537.36 (KHTML, like Gecko)'

describe('deviceWords()', () => {
  it.each([
    [
      'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0',
      'Firefox, computer with Linux',
    ],
    [
      `Mozilla/5.0 (Windows NT 10.0; Win64; x64) ${webkit} Chrome/140.0.0.0 Safari/537.36`,
      'Chrome, computer with Windows',
    ],
    [
      `Mozilla/5.0 (Windows NT 10.0; Win64; x64) ${webkit} Chrome/140.0.0.0 Safari/537.36 Edg/140.0.0.0`,
      'Edge, computer with Windows',
    ],
    [
      `Mozilla/5.0 (Linux; Android 10; K) ${webkit} Chrome/140.0.0.0 Mobile Safari/537.36`,
      'Chrome, phone with Android',
    ],
    [
      `Mozilla/5.0 (Linux; Android 10; K) ${webkit} Chrome/140.0.0.0 Safari/537.36`,
      'Chrome, tablet with Android',
    ],
    [
      'Mozilla/5.0 (iPad; CPU OS 18_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.5 Mobile/15E148 Safari/604.1',
      'Safari, tablet with iPadOS',
    ],
    ['Mozilla/5.0 (Windows NT 10.0)', 'A computer with Windows'],
    ['Firefox/140.0', 'Firefox'],
    ['curl/8.5.0', 'A device that does not say what it is'],
    ['', 'A device that does not say what it is'],
  ])('deviceWords(%j) is %j', (userAgent, words) => {
    expect(deviceWords(userAgent)).toBe(words)
  })
})
