import { ensureDebian, onPath } from '../../db/server/debian.mjs'

/** Debian's browser, installed when it is missing. */
export const ensureChromium = () =>
  ensureDebian({
    find: () => onPath('chromium'),
    packages: ['chromium'],
    purpose: 'The browser for the tests',
  })
