import { plainField } from './plain-field'
import { notNegative } from './usual'

/** Without it nobody knows how near the crowns come to the deck. */
export const deckHeightField = plainField(['shape', 'deckHeightMm'], 'Deck height', 'length', 'mm', {
  optional: true,
  refuse: notNegative('A length'),
})
