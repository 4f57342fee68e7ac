import { dayWords } from './day-words'
import { link, quote, words, type Letter } from './letter'
import type { LetterData, LetterName } from './letter-data'

type Reader = { name: string }

const leave = 'If it was not meant for you, leave it: nothing happens.'

/** What each letter says. */
export const letters: { [Name in LetterName]: (data: LetterData[Name], reader: Reader) => Letter } = {
  invitation: ({ workshop, role, inviter, url, endsAt }) => ({
    subject: `${inviter} invites you to ${workshop}`,
    greeting: null,
    blocks: [
      words(`${inviter} invites you to the workshop ${workshop} on Counterthrow, as ${role}.`),
      link('Look at the invitation', url),
      words(`The link works once, until ${dayWords(endsAt)}. Opening it only shows the invitation.`),
    ],
    because: `You get this because ${inviter} gave your address. ${leave}`,
  }),

  'password-reset': ({ name, url, minutes }) => ({
    subject: 'A new password for Counterthrow',
    greeting: name,
    blocks: [
      words('somebody, most likely you, asked for a new password.'),
      link('Set it here', url),
      words(`The link works once, within ${minutes} minutes.`),
    ],
    because:
      'Counterthrow sent this because your address was given. If it was not you, leave it: nothing has changed.',
  }),

  'review-asked': ({ scene, version, asker, due, message, url }, { name }) => ({
    subject: `${asker} asks you to review ${scene}, version ${version}`,
    greeting: name,
    blocks: [
      words(
        `${asker} asks for your verdict on ${scene}, version ${version}${due ? `, by ${dayWords(due)}` : ''}.`,
      ),
      ...quote(message),
      link('Open the review', url),
    ],
    because: `You get this because ${asker} named you as a reviewer.`,
  }),

  'review-answered': ({ scene, version, person, word, sentence, url }, { name }) => ({
    subject: `${scene}, version ${version}: ${word}`,
    greeting: name,
    blocks: [
      words(`${person} has given a verdict on ${scene}, version ${version}: ${word}.`),
      ...quote(sentence),
      link('Open the review', url),
    ],
    because:
      'You get this because you drew this version, asked for its review or made the link it was given through.',
  }),

  'review-reminder': ({ scene, version, asker, due, url }, { name }) => ({
    subject: `Due ${dayWords(due)}: ${scene}, version ${version}`,
    greeting: name,
    blocks: [
      words(
        `${asker} waits for your verdict on ${scene}, version ${version}. It is due on ${dayWords(due)}.`,
      ),
      link('Open the review', url),
    ],
    because: `You get this because ${asker} named you as a reviewer and there is no verdict of yours yet.`,
  }),

  question: ({ scene, visitor, email, question, step, url }, { name }) => ({
    subject: `A question about ${scene}`,
    greeting: name,
    blocks: [
      words(`${visitor} (${email}) asks about ${scene}${step ? `, ${step}` : ''}:`),
      ...quote(question),
      link('See the link and its questions', url),
      words('An answer to this mail goes to them.'),
    ],
    because: 'You get this because the question was asked through a link that you made.',
    replyTo: email,
  }),

  'question-copy': ({ workshop, question }) => ({
    subject: `Your question to ${workshop}`,
    greeting: null,
    blocks: [
      words(`your question went to ${workshop}. They answer by mail. This is what you asked:`),
      ...quote(question),
    ],
    because:
      'Counterthrow sent this copy because your address was given with the question. If it was not you, leave it: nothing more comes.',
  }),

  'mention-digest': ({ mentions }, { name }) => ({
    subject:
      mentions.length === 1
        ? `${mentions[0].by} named you in note ${mentions[0].number}, ${mentions[0].scene}`
        : `You were named ${mentions.length} times`,
    greeting: name,
    blocks: mentions.flatMap(({ scene, number, by, words: said, url }) => [
      words(`${by} named you in note ${number}, ${scene}:`),
      ...quote(said),
      link('Go to the note', url),
    ]),
    because: 'You get this because somebody in your workshop named you in a note.',
  }),

  link: ({ sender, workshop, scene, message, url }, { name }) => ({
    subject: `${scene}, from ${sender}`,
    greeting: name,
    blocks: [...quote(message), link('Open it, without an account', url)],
    because: `${sender} of ${workshop} sent you this link with Counterthrow.`,
  }),
}
