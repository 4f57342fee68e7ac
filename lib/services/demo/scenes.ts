import type { CrankTrain } from '@/scene/model/crank-train'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import type { Scene } from '@/scene/model/scene'

interface DemoVersion {
  message: string
  document: Scene
}

interface DemoScene {
  title: string
  /** The e-mail address. */
  author: string
  versions: DemoVersion[]
  archived?: boolean
}

function train(id: string): CrankTrain {
  const preset = presetById(id)
  if (!preset) throw new Error(`There is no preset ${id}.`)
  return preset.train
}

const look = (of: CrankTrain, view: Partial<Scene['view']> = {}): Scene => {
  const scene = newScene(of)
  return { ...scene, view: { ...scene.view, ...view } }
}

const version = (message: string, document: Scene): DemoVersion => ({ message, document })

const cross = train('v8x-5000')
const flat = train('v8f-4200')
const twin = train('v2-45-1600')
const diesel = train('i6d-12800')
const lighterPin: CrankTrain = {
  ...cross,
  masses: { ...cross.masses, pistonPinKg: (cross.masses.pistonPinKg ?? 0) - 0.002 },
}
const wider: CrankTrain = {
  ...lighterPin,
  counterweights: cross.counterweights.map((weight) => ({ ...weight, radiusMm: weight.radiusMm + 1 })),
}

const balanced = (balanceFactor: number) =>
  version(
    `Balance factor ${Math.round(balanceFactor * 100)} %`,
    look({ ...twin, balanceFactor }, { speedRpm: 5800, angleDeg: 45 }),
  )

export const demoScenes = {
  cross: {
    title: '90° V8 5.0 L, cross plane',
    author: 'ysolde@larkspur.example',
    versions: [
      version('As drawn', look(cross)),
      version('Looked at from the drive end, at 7000 rpm', look(cross, { speedRpm: 7000, angleDeg: 90 })),
      version('Piston pins 2 g lighter', look(lighterPin, { speedRpm: 7000, angleDeg: 90 })),
      version('Every counterweight 1 mm further out', look(wider, { speedRpm: 7000, angleDeg: 90 })),
    ],
  },
  flat: {
    title: '90° V8 4.2 L, flat plane',
    author: 'ysolde@larkspur.example',
    versions: [
      version('For comparison with the cross plane', look(flat)),
      version('At 7000 rpm, like the other', look(flat, { speedRpm: 7000, angleDeg: 90 })),
    ],
  },
  twin: {
    title: '45° twin: which balance factor?',
    author: 'ysolde@larkspur.example',
    versions: [balanced(0.5), balanced(0.56), balanced(0.6)],
  },
  three: {
    title: 'In-line three with a balance shaft',
    author: 'odo@larkspur.example',
    versions: [version('As drawn', look(train('i3-1000')))],
  },
  old: {
    title: 'Single, first sketch',
    author: 'odo@larkspur.example',
    versions: [version('Sketch', look(train('single-450')))],
    archived: true,
  },
  rebuild: {
    title: 'V8 of the club racer',
    author: 'tamsin@thornquay.example',
    versions: [
      version('As it came in', look(cross)),
      version('Crank pin 3 to the front', look(cross, { angleDeg: 270, hidden: ['bores'] })),
    ],
  },
  diesel: {
    title: 'Heavy diesel six, Mossgate',
    author: 'tamsin@thornquay.example',
    versions: [
      version('As it came in', look(diesel)),
      version(
        'Gas and inertia apart',
        look(diesel, { overlays: { ...look(diesel).view.overlays, gas: true, inertia: true } }),
      ),
    ],
  },
  ferry: {
    title: 'Slow two-stroke six, Greyholm',
    author: 'tamsin@thornquay.example',
    versions: [version('From the maker’s sheet', look(train('m6-2t-520')))],
  },
  radial: {
    title: 'Seven-cylinder radial',
    author: 'tamsin@thornquay.example',
    versions: [version('Master rod in cylinder 1', look(train('r7-11')))],
  },
} satisfies Record<string, DemoScene>
