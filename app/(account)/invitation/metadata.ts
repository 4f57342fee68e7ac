import type { Metadata } from 'next'

/** The address is a key: nobody keeps it, and it is told to no other page. */
export const invitationMetadata: Metadata = {
  title: 'Invitation',
  referrer: 'no-referrer',
  robots: { index: false },
}
