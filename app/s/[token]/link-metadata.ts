import type { Metadata } from 'next'

/** The address is a secret: it is neither indexed nor told to anybody who is linked from here. */
export const linkMetadata: Metadata = {
  title: 'Shared scene',
  referrer: 'no-referrer',
  robots: { index: false, follow: false },
}
