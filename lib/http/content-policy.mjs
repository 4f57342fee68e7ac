const developing = process.env.NODE_ENV === 'development'

// The framework's own start-up scripts and styles are inline; hot reload evaluates and keeps a socket open.
const policy = {
  'default-src': ["'self'"],
  'script-src': ["'self'", "'unsafe-inline'", developing && "'unsafe-eval'"],
  'style-src': ["'self'", "'unsafe-inline'"],
  'img-src': ["'self'", 'data:', 'blob:'],
  'font-src': ["'self'"],
  'connect-src': ["'self'", developing && 'ws:'],
  'worker-src': ["'self'", 'blob:'],
  'object-src': ["'none'"],
  'base-uri': ["'self'"],
  'form-action': ["'self'"],
}

/** What a page may load, and which sites may show it in a frame: none unless they are named. */
export const contentPolicy = (frames = []) =>
  Object.entries({ ...policy, 'frame-ancestors': frames.length > 0 ? frames : ["'none'"] })
    .map(([directive, sources]) => [directive, ...sources.filter(Boolean)].join(' '))
    .join('; ')
