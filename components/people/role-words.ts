import { roles, type Role } from '@/lib/auth/access'

/** What each role is for; the table of access says it to the letter. */
export const roleWords: Record<Role, string> = {
  owner: 'Everything, people and settings too',
  designer: 'Makes and saves scenes, asks for reviews, sends links',
  sales: 'Looks at scenes, sends links',
  service: 'Looks at scenes and copies them',
  reviewer: 'Looks, writes notes, gives verdicts',
}

export const roleOptions = roles.map((role) => ({ role, words: roleWords[role] }))
