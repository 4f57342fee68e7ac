import { servedPage } from '@/tests/support/drawing/served-page'

/** The page of ./page: the canvas renderer alone. */
export const test = servedPage('tests/rendering/canvas/page')
export { expect } from '@playwright/test'
