import { PrismaticJoint, RevoluteJoint, Settings, Vec2, World, type Body } from 'planck'
import { rodMotion } from './linkage'
import type { PlainCylinder, PlainTrain } from './plain-train'

export interface EngineRod {
  bank: number // degrees
  rod: number
  offset: number
  piston: number
  mass: number
  cg: number // from the big end
  inertia: number
  knuckle?: { radius: number; angleDeg: number }
}

export interface EngineRig {
  /** Constant force on every piston towards the crank, N. */
  gas: number
  rods: EngineRod[]
}

const DEG = Math.PI / 180
const RADIUS = 1

/**
 * One crank of radius 1 m turned at constant speed in a general rigid-body engine: rows every 5° over one turn of
 * [crank pin load (2), each rod's load from its piston (2 each), each link's load on its knuckle (2 each)], engine frame.
 * The engine's x is vertical and its y horizontal, so that its angles are ours.
 */
export function runInEngine({ rods, gas }: EngineRig, speed: number, stepsPerTurn: number): number[][] {
  const slop = Settings.linearSlop
  // positions are corrected at every step, however small the gap
  Settings.linearSlop = 1e-9
  try {
    return run(rods, gas, speed, stepsPerTurn)
  } finally {
    Settings.linearSlop = slop
  }
}

function run(rods: EngineRod[], gas: number, speed: number, stepsPerTurn: number) {
  const world = new World({ gravity: Vec2(0, 0), allowSleep: false })
  const ground = world.createBody()
  const lead = -30 * DEG // a run-up settles the solver
  const start = startOf(rods, lead)
  const crank = world.createBody({ type: 'kinematic', angle: lead, angularVelocity: speed })

  const bodies = rods.map((rod, k) => {
    const m = start[k]
    const link = world.createBody({
      type: 'dynamic',
      position: Vec2(m.bigEnd.at[0], m.bigEnd.at[1]),
      angle: m.angle,
      linearVelocity: Vec2(m.bigEnd.d1[0] * speed, m.bigEnd.d1[1] * speed),
      angularVelocity: m.angleD1 * speed,
    })
    link.setMassData({ mass: rod.mass, center: Vec2(rod.cg, 0), I: rod.inertia + rod.mass * rod.cg ** 2 })
    link.setLinearVelocity(Vec2(m.cg.d1[0] * speed, m.cg.d1[1] * speed))
    const piston = world.createBody({
      type: 'dynamic',
      position: Vec2(m.pistonPin.at[0], m.pistonPin.at[1]),
      fixedRotation: true,
      linearVelocity: Vec2(m.pistonPin.d1[0] * speed, m.pistonPin.d1[1] * speed),
    })
    piston.setMassData({ mass: rod.piston, center: Vec2(0, 0), I: 0 })
    return { link, piston }
  })
  const joint = (a: Body, b: Body, at: Vec2) => world.createJoint(new RevoluteJoint({}, a, b, at))!
  const joints = rods.map((rod, k) => {
    const { link, piston } = bodies[k]
    const m = start[k]
    const axis = Vec2(Math.cos(rod.bank * DEG), Math.sin(rod.bank * DEG))
    world.createJoint(new PrismaticJoint({}, ground, piston, piston.getPosition().clone(), axis))
    return {
      foot: joint(rod.knuckle ? bodies[0].link : crank, link, Vec2(m.bigEnd.at[0], m.bigEnd.at[1])),
      top: joint(piston, link, Vec2(m.pistonPin.at[0], m.pistonPin.at[1])),
    }
  })

  const dt = (2 * Math.PI) / speed / stepsPerTurn
  const every = stepsPerTurn / 72
  const rows: number[][] = []
  const runUp = Math.round((-lead / (2 * Math.PI)) * stepsPerTurn)
  for (let step = 1 - runUp; step < stepsPerTurn + 1; step++) {
    bodies.forEach(({ piston }, k) => {
      const angle = rods[k].bank * DEG
      piston.applyForceToCenter(Vec2(-gas * Math.cos(angle), -gas * Math.sin(angle)), true)
    })
    world.step(dt, 60, 20)
    if (step < 0 || step % every !== 0 || rows.length === 72) continue
    const onFeet = joints.map(({ foot }) => foot.getReactionForce(1 / dt))
    const onTops = joints.map(({ top }) => top.getReactionForce(1 / dt))
    rows.push([
      -onFeet[0].x,
      -onFeet[0].y,
      ...onTops.flatMap((f) => [f.x, f.y]),
      ...onFeet.slice(1).flatMap((f) => [-f.x, -f.y]),
    ])
  }
  return rows
}

/** Where everything stands and how fast it moves at the start, from the loop equations. */
function startOf(rods: EngineRod[], angle: number) {
  const cylinders = rods.map(
    (rod, k) =>
      ({
        id: `${k}`,
        bank: rod.bank * DEG,
        throwIndex: 0,
        radius: RADIUS,
        rod: rod.rod,
        offset: rod.offset,
        rodCg: rod.cg,
        link: rod.knuckle && { master: 0, radius: rod.knuckle.radius, angle: rod.knuckle.angleDeg * DEG },
      }) as PlainCylinder,
  )
  const train = {
    cylinders,
    throws: [{ angle: 0, z: 0, unbalance: 0, radius: RADIUS }],
  } as unknown as PlainTrain
  return rods.map((_, k) => rodMotion(train, k, angle))
}
