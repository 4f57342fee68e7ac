// The one-way rule of the house as data: what each room may import from other rooms and from packages.
// Whatever is not listed is refused, type imports too. `node: true` lets Node's built-ins in.

const numbers = ['units', 'numerics']
const kernel = [...numbers, 'mechanics']
const pureRooms = [...kernel, 'model', 'frame']

/** Rooms that run unchanged in a page, a worker and a server: no page, no built-ins, no clock, no chance. */
export const pure = [
  'lib/units',
  'lib/numerics',
  'lib/mechanics',
  'lib/sheet',
  'lib/letters',
  'lib/review',
  'scene/model',
  'scene/frame',
]

const react = ['react', 'react-dom']
const three = ['three', '@react-three/fiber', '@react-three/drei']

export const rooms = {
  units: { folder: 'lib/units', rooms: [], packages: [] },
  numerics: { folder: 'lib/numerics', rooms: [], packages: ['ml-matrix'] },
  tables: { folder: 'lib/tables', rooms: [], packages: ['papaparse'] },
  mechanics: { folder: 'lib/mechanics', rooms: numbers, packages: [] },
  model: { folder: 'scene/model', rooms: kernel, packages: ['zod'] },
  frame: { folder: 'scene/frame', rooms: [...kernel, 'model'], packages: [] },

  // what is printed, before it has a layout: the sheet and its preview read the same
  sheet: { folder: 'lib/sheet', rooms: [...pureRooms, 'tables'], packages: [] },
  // files for others: what a design sheet and a model are written with
  export: {
    folder: 'lib/export',
    rooms: [...pureRooms, 'sheet'],
    packages: ['pdfkit', '@gltf-transform/core'],
  },

  // pictures of scenes as PNG, drawn with the canvas renderer's own raster
  pictures: { folder: 'lib/pictures', rooms: [...pureRooms, 'canvas', 'stage'], packages: ['sharp'] },

  canvas: { folder: 'scene/canvas', rooms: ['frame'], packages: [] },
  webgl: { folder: 'scene/webgl', rooms: ['frame'], packages: [...react, ...three] },
  stage: { folder: 'scene/stage', rooms: [...pureRooms, 'canvas', 'webgl', 'clock'], packages: react },
  session: {
    folder: 'scene/session',
    rooms: [...pureRooms, 'stage', 'clock'],
    packages: ['react', 'zustand'],
  },

  ui: {
    folder: 'components/ui',
    rooms: ['tables'],
    packages: [...react, 'next', 'swr', 'd3-scale', 'd3-shape'],
  },
  shell: { folder: 'components/shell', rooms: ['ui'], packages: [...react, 'next'] },
  drawing: {
    folder: 'components/drawing',
    rooms: [...pureRooms, 'ui', 'shell', 'stage', 'session', 'clock'],
    packages: [...react, 'next'],
  },
  // figures as every feature shows them: notes, charts over the cycle, leaves of the bench
  figures: {
    folder: 'components/figures',
    rooms: [...pureRooms, 'tables', 'ui', 'session', 'clock', 'contracts', 'errors'],
    packages: [...react, 'next', 'swr', 'zustand'],
  },
  feature: {
    folder: 'components/*',
    rooms: [
      ...pureRooms,
      'tables',
      'sheet',
      'letters',
      'ui',
      'shell',
      'drawing',
      'figures',
      'stage',
      'session',
      'clock',
      'review',
      'contracts',
      'errors',
      'access',
    ],
    packages: [...react, 'next', 'swr', 'zod', 'zustand'],
  },

  // what may become of a version: its states, who moves it between them and what holds that up
  review: { folder: 'lib/review', rooms: ['access'], packages: [] },

  // what mails say, as text and HTML from one content
  letters: { folder: 'lib/letters', rooms: [], packages: ['zod'] },

  contracts: {
    folder: 'lib/contracts',
    rooms: [...pureRooms, 'sheet', 'letters', 'review', 'access'],
    packages: ['zod', 'zod-openapi'],
  },
  errors: { folder: 'lib/errors', rooms: [], packages: ['zod'] },
  config: { folder: 'lib/config', rooms: [], packages: ['zod', 'server-only'], node: true },
  migrations: { folder: 'drizzle', rooms: [] },
  database: {
    folder: 'db',
    rooms: [...pureRooms, 'review', 'migrations', 'config', 'contracts', 'errors'],
    packages: ['drizzle-orm', 'graphile-worker', 'postgres', 'server-only', 'zod', '@node-rs/argon2'],
    node: true,
  },
  adapters: {
    folder: 'lib/adapters',
    rooms: ['config', 'errors'],
    packages: ['server-only', 'zod', 'nodemailer', 'resend'],
    node: true,
  },
  auth: {
    folder: 'lib/auth',
    rooms: ['database', 'config', 'contracts', 'errors'],
    packages: [
      'lucia',
      '@lucia-auth/adapter-drizzle',
      '@node-rs/argon2',
      'drizzle-orm',
      'next',
      'react',
      'server-only',
      'zod',
    ],
    node: true,
  },
  // what is done in the background: jobs put in by services, carried out by workers
  queue: {
    folder: 'lib/queue',
    rooms: ['database'],
    packages: ['drizzle-orm', 'graphile-worker', 'server-only', 'zod'],
    node: true,
  },
  tasks: {
    folder: 'lib/tasks',
    rooms: ['queue', 'services', 'database', 'config'],
    packages: ['graphile-worker', 'server-only', 'zod'],
    node: true,
  },
  services: {
    folder: 'lib/services',
    rooms: [
      ...pureRooms,
      'tables',
      'sheet',
      'export',
      'pictures',
      'letters',
      'review',
      'database',
      'queue',
      'adapters',
      'auth',
      'config',
      'contracts',
      'errors',
    ],
    packages: ['drizzle-orm', 'server-only', 'sharp', 'zod'],
    node: true,
  },
  http: {
    folder: 'lib/http',
    rooms: ['auth', 'config', 'contracts', 'errors', 'services'],
    packages: ['next', 'server-only', 'zod', 'zod-openapi'],
    node: true,
  },

  app: {
    folder: 'app',
    rooms: [
      ...pureRooms,
      ...[
        'tables',
        'sheet',
        'export',
        'pictures',
        'letters',
        'ui',
        'shell',
        'drawing',
        'figures',
        'feature',
        'session',
        'clock',
        'stage',
        'canvas',
      ],
      ...['review', 'contracts', 'errors', 'config', 'auth', 'services', 'http', 'adapters'],
    ],
    packages: [...react, 'next', 'server-only', 'swr', 'zod', 'zod-openapi'],
    node: true,
  },
}

/** Single files that are open to more than their room is, or may reach further. */
export const doors = {
  // the table of roles and what they may do: plain data, one source for server, page and tests
  access: { file: 'lib/auth/access.ts', room: 'auth' },
  clock: { file: 'scene/session/clock.ts', room: 'session' },
  health: { file: 'app/api/v1/health/route.ts', room: 'app', rooms: ['database'] },
  // puts the worker and its services into one file
  bundle: { file: 'db/server/bundle.mjs', room: 'database', packages: ['vite'] },
  // reads the services, which are TypeScript, before any build is there
  seed: { file: 'db/seed.mjs', room: 'database', packages: ['vite'] },
}
