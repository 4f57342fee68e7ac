import { eq } from 'drizzle-orm'
import { read, write, type Transaction } from '@/db/client'
import { userByEmail } from '@/db/queries/users'
import { memberships, seeds, shareLinks, users, workshops } from '@/db/schema'
import type { LinkKind, Person } from '@/lib/auth/access'
import { hashPassword } from '@/lib/auth/passwords'
import { personOfUser } from '@/lib/auth/person'
import { archiveScene } from './archive-scene'
import { audit } from './audit'
import { createScene } from './create-scene'
import { createShareLink } from './create-share-link'
import { demo } from './demo/people'
import { demoInvitations } from './demo/invitations'
import { visitLink } from './demo/link-visits'
import { demoGuestNote, demoNotes } from './demo/notes'
import { demoReviews } from './demo/reviews'
import { demoScenes } from './demo/scenes'
import { sendLinks } from './demo/sent-links'
import { listShareLinks } from './list-share-links'
import { revokeShareLink } from './revoke-share-link'
import { saveDraft } from './save-draft'
import { saveVersion } from './save-version'

const day = 86_400_000

/**
 * Puts the demonstration in, by the same services that people use. Whoever calls it holds a lock. Each step may have
 * been done already, by a run that was cut short: then it changes nothing.
 */
export async function seedDemo(): Promise<void> {
  await write(insertPeople(await hashPassword(demo.password)))
  const people = await read(readPeople)

  const places: Record<string, string> = {}
  for (const [name, { title, author, versions, ...more }] of Object.entries(demoScenes)) {
    const person = people[author]
    const [first, ...later] = versions
    const made = await createScene(person, { title, ...first }, `demo-${name}-1`)
    for (const [index, next] of later.entries()) {
      await saveVersion(person, made.scene.id, { base: index + 1, ...next }, `demo-${name}-${index + 2}`)
    }
    if ('archived' in more) await archiveScene(person, made.scene.id)
    places[name] = made.scene.id
  }

  await demoNotes(people['ysolde@larkspur.example'], people['ines@quillmarsh.example'], places)
  await demoReviews(people['ysolde@larkspur.example'], people['ines@quillmarsh.example'], places)
  await demoInvitations(people['tamsin@thornquay.example'])
  await makeLinks(people['fenn@larkspur.example'], places.cross)
  await saveDraft(people['ysolde@larkspur.example'], places.twin, {
    base: 3,
    document: demoScenes.twin.versions[1].document,
  })
  await write((tx) => tx.insert(seeds).values({ name: 'demo' }).onConflictDoNothing())
}

const insertPeople = (passwordHash: string) => async (tx: Transaction) => {
  if (await userByEmail(tx, demo.people[0].email)) return
  const rows = await tx
    .insert(workshops)
    .values(demo.workshops.map((name) => ({ name })))
    .returning()
  for (const { name, email, roles } of demo.people) {
    // memberships that begin together do not say which workshop is before them: the first that is named
    const [before] = rows.filter((row) => row.name === Object.keys(roles)[0])
    const person = { name, email, passwordHash, workshopId: before.id }
    const [user] = await tx.insert(users).values(person).returning()
    for (const workshop of rows) {
      const role = roles[workshop.name]
      if (!role) continue
      await tx.insert(memberships).values({ workshopId: workshop.id, userId: user.id, role })
      await audit(tx, {
        actorId: null,
        workshopId: workshop.id,
        operation: 'person.seed',
        subject: `person:${user.id}`,
        after: { name, role },
      })
    }
  }
}

/** By their addresses. */
async function readPeople(tx: Transaction): Promise<Record<string, Person>> {
  const people: Record<string, Person> = {}
  for (const { email } of demo.people) {
    const user = await userByEmail(tx, email)
    if (!user) throw new Error(`${email} is missing.`)
    people[email] = await personOfUser(tx, user)
  }
  return people
}

/** One link that opens, one withdrawn and one past its end; the mail with the first can be read in the local post. */
async function makeLinks(fenn: Person, sceneId: string): Promise<void> {
  if ((await listShareLinks(fenn, sceneId)).length > 0) return
  const make = (label: string, version: number | null, days: number, kind: LinkKind = 'look') =>
    createShareLink(fenn, sceneId, {
      kind,
      label,
      version,
      endsAt: new Date(Date.now() + days * day).toISOString(),
    })

  const ended = await make('First look, ended', 1, 1)
  await write((tx) =>
    tx
      .update(shareLinks)
      .set({ endsAt: new Date(Date.now() - day) })
      .where(eq(shareLinks.id, ended.link.id)),
  )
  const withdrawn = await make('Sent to the wrong address', 2, 30)
  await revokeShareLink(fenn, withdrawn.link.id)
  const live = await make('For Delphine Astercroft', null, 30, 'note')
  await sendLinks(fenn, demoScenes.cross.title, { live: live.url, astray: withdrawn.url })
  await visitLink(live)
  await demoGuestNote(live.url.split('/s/')[1])
}
