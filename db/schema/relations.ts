import { relations } from 'drizzle-orm'
import { memberships } from './memberships'
import { sceneVersions } from './scene-versions'
import { scenes } from './scenes'
import { shareLinks } from './share-links'
import { users } from './users'
import { workshops } from './workshops'

export const userRelations = relations(users, ({ many }) => ({ memberships: many(memberships) }))

export const workshopRelations = relations(workshops, ({ many }) => ({
  memberships: many(memberships),
  scenes: many(scenes),
}))

export const membershipRelations = relations(memberships, ({ one }) => ({
  user: one(users, { fields: [memberships.userId], references: [users.id] }),
  workshop: one(workshops, { fields: [memberships.workshopId], references: [workshops.id] }),
}))

export const sceneRelations = relations(scenes, ({ one, many }) => ({
  workshop: one(workshops, { fields: [scenes.workshopId], references: [workshops.id] }),
  versions: many(sceneVersions),
  links: many(shareLinks),
}))

export const sceneVersionRelations = relations(sceneVersions, ({ one }) => ({
  scene: one(scenes, { fields: [sceneVersions.sceneId], references: [scenes.id] }),
  author: one(users, { fields: [sceneVersions.authorId], references: [users.id] }),
}))

export const shareLinkRelations = relations(shareLinks, ({ one }) => ({
  scene: one(scenes, { fields: [shareLinks.sceneId], references: [scenes.id] }),
  author: one(users, { fields: [shareLinks.createdBy], references: [users.id] }),
}))
