import { BARRIERS } from '../catalogue/barriers'
import { EDGE_FACTORS } from '../checks/what-decides'
import type { CourseScene, Guess, Leg, Topic } from './course'
import { groundOf, WET_GRASS } from './grounds'
import type { DemoSetting, DemoValues } from './setting'

/** The tube that every standard scene is shown with. */
const TUBE = BARRIERS.find(({ id }) => id === 'tube-0.70')!

/** How a scene begins unless it says otherwise: laid, filled, dry. */
const LAID: DemoValues = {
  depth: 0,
  dryDepth: 0,
  skirtLength: TUBE.skirtLength,
  airPressure: TUBE.airPressure,
  filledAt: 15,
  temperature: 15,
  edgeFactor: EDGE_FACTORS.open,
  gust: 0,
  crease: 0,
  rateOfRise: 0,
  clearingTime: 0,
}

const { diameter, skirtLength, contactWidth, mass, airPressure, sectionLength, fabricStrength } =
  TUBE

function start(values: Partial<DemoValues>, ground = groundOf('turf')): DemoSetting {
  return {
    tube: {
      diameter,
      skirtLength,
      contactWidth,
      mass,
      airPressure,
      sectionLength,
      fabricStrength,
    },
    ground,
    values: { ...LAID, ...values },
    hasStone: false,
  }
}

function leg(value: Leg['value'], to: Leg['to'], seconds: number): Leg {
  return { value, to, seconds }
}

const guess = {
  mass: (max: number, step: number): Guess => ({
    kind: 'massPerLength',
    place: 'bar',
    ...{ min: 0, max, step, decimals: 0 },
  }),
  level: (place: Guess['place'], max: number): Guess => ({
    kind: 'length',
    place,
    ...{ min: 0, max, step: 0.01, decimals: 2 },
  }),
  other: (kind: Guess['kind'], max: number, step: number): Guess => ({
    kind,
    place: 'bar',
    ...{ min: 0, max, step, decimals: 0 },
  }),
}

/** Water of the standard scenes [m]. */
const WATER = 0.42

/** A rise of 0.3 m in an hour [m/s], and 20 minutes to clear the area [s]. */
const RISE = { rateOfRise: 0.3 / 3600, clearingTime: 20 * 60 }

function scene(
  topic: Topic,
  setting: DemoSetting,
  asked: Guess,
  legs: readonly Leg[],
): CourseScene {
  return { id: topic, topic, start: setting, guess: asked, legs }
}

/** The standard scenes, in the order of the full course. */
export const STANDARD_SCENES: readonly CourseScene[] = [
  scene('push', start({ depth: 0.275 }), guess.mass(300, 5), [leg('depth', 0.55, 6)]),
  scene('floats', start({ skirtLength: 0 }), guess.level('level', diameter), [
    leg('depth', 'answer', 3),
    leg('depth', 0.2, 5),
  ]),
  scene('unroll', start({ skirtLength: 0 }), guess.mass(1200, 20), [
    leg('skirtLength', skirtLength, 3),
    leg('depth', WATER, 5),
  ]),
  scene('grip', start({}, WET_GRASS), guess.level('chart', diameter), [leg('depth', 'answer', 8)]),
  scene(
    'creep',
    start({ depth: WATER, edgeFactor: EDGE_FACTORS.sealed, crease: 0.001 }),
    guess.other('percent', 1, 0.01),
    [leg('edgeFactor', EDGE_FACTORS.open, 6)],
  ),
  scene('grounds', start({ depth: 0.2 }, groundOf('asphalt')), guess.level('level', diameter), [
    leg('depth', 'answer', 6),
  ]),
  scene(
    'night',
    start({ depth: 0.48, airPressure: 12_000, filledAt: 25, temperature: 25 }),
    guess.other('smallLength', 0.1, 0.001),
    [leg('temperature', 0, 7)],
  ),
  scene('puncture', start({ depth: WATER }), guess.other('flowRate', 8, 0.1), [
    leg('airPressure', 1, 7),
  ]),
  scene('wind', start({}), { ...guess.other('speed', 30, 0.5), decimals: 1 }, [
    leg('gust', 'answer', 5),
  ]),
  scene('pond', start({ depth: WATER }), guess.level('dryLevel', 0.3), [
    leg('dryDepth', 'answer', 6),
  ]),
  scene('leave', start({ depth: 0.1, ...RISE }), guess.level('level', diameter), [
    leg('depth', 'answer', 7),
  ]),
]
