import { config, type Config } from '@/lib/config'
import { localMailer } from './local'
import type { Mailer } from './port'

const mailers: Record<Config['mail'], Mailer> = { local: localMailer }

export const mailer = (): Mailer => mailers[config().mail]
