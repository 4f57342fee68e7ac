import { randomUUID } from 'node:crypto'
import { mkdir, readdir, readFile, rename, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { z } from 'zod'
import { config } from '@/lib/config'
import type { Mail, Mailer } from './port'

const keptMail = z.object({ to: z.string(), subject: z.string(), text: z.string(), sentAt: z.string() })
export type KeptMail = z.output<typeof keptMail> & { id: string }

const folder = () => join(config().dataFolder, 'mail')

/** Sends nothing: keeps each mail as a file, where a page of the running product shows it. */
export const localMailer: Mailer = {
  async send(mail: Mail) {
    await mkdir(folder(), { recursive: true, mode: 0o700 })
    const sentAt = new Date().toISOString()
    const file = join(folder(), `${sentAt.replace(/\D/g, '')}-${randomUUID()}.json`)
    // whole or not at all, since it may be read at any moment
    await writeFile(`${file}.part`, JSON.stringify({ ...mail, sentAt }), { mode: 0o600 })
    await rename(`${file}.part`, file)
  },
}

/** The newest mails first: names begin with the time. */
export async function keptMails(most = 100): Promise<KeptMail[]> {
  const files = await readdir(folder()).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return []
    throw error
  })
  const names = files
    .filter((name) => name.endsWith('.json'))
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
