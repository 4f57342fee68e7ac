export const namedViews = ['free', 'end', 'drive', 'side', 'bank', 'top'] as const
export type NamedView = (typeof namedViews)[number]
