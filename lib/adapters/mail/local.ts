import { link, mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { z } from 'zod'
import { config } from '@/lib/config'
import type { Mail, Mailer } from './port'

const keptMail = z.object({
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string(),
  headers: z.record(z.string(), z.string()),
  sentAt: z.string(),
})
export type KeptMail = z.output<typeof keptMail> & { id: string }

const folder = () => join(config().dataFolder, 'mail')

/** Sends nothing: keeps each mail as a file, once, where a page of the running product shows it. */
export const localMailer: Mailer = {
  repeatable: true,
  async send(mail: Mail) {
    await mkdir(folder(), { recursive: true, mode: 0o700 })
    const part = join(folder(), `${mail.id}-${process.pid}.part`)
    const kept = { ...mail, to: mail.to.email, sentAt: new Date().toISOString() }
    await writeFile(part, JSON.stringify(kept), { mode: 0o600 })
    try {
      // whole or not at all, since it may be read at any moment; and never over one that is there
      await link(part, join(folder(), `${mail.id}.json`))
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
    } finally {
      await rm(part, { force: true })
    }
  },
}

/** The newest mails first: ids begin with the time. */
export async function keptMails(most = 100): Promise<KeptMail[]> {
  const files = await readdir(folder()).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return []
    throw error
  })
  const names = files
    .filter((name) => /^[0-9a-f-]{36}\.json$/.test(name))
    .sort()
    .reverse()
    .slice(0, most)
  return Promise.all(
    names.map(async (name) => ({
      id: name.replace('.json', ''),
      ...keptMail.parse(JSON.parse(await readFile(join(folder(), name), 'utf8'))),
    })),
  )
}
