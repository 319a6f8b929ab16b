import { loadedShape, type StandingShape } from '../calc/loaded-shape/loaded-shape'
import { loadedOutline } from '../calc/loaded-shape/loaded-outline'
import { weldAngles, type Membrane } from '../calc/loaded-shape/membrane'
import { wetLengthPlusRun, wetRun } from '../calc/loaded-shape/skin-length'
import { figure, type CheckRow } from './check-row'

const UNIT_WEIGHT = 9810

/** A standing shape with a skirt of three diameters; a check value that does not stand is a mistake. */
function standing(diameter: number, airPressure: number, depth: number): StandingShape {
  const shape = loadedShape({
    diameter,
    airPressure,
    wettedSkirt: 3 * diameter,
    depth,
    unitWeight: UNIT_WEIGHT,
  })
  if (!shape.solved) throw new Error(`no shape stands: ${shape.reason}`)
  return shape
}

/** A dam of height 1 m with its heel on the ground: the weld line lies at the ground. */
function dam(depth: number, airPressure: number): Membrane {
  return { depth, perimeter: 0, kappa: UNIT_WEIGHT / (2 * airPressure) }
}

/** Wet length over height with the water at the crest, p = α γ H. */
function wetLengthAtCrest(alpha: number): number {
  const membrane = dam(1, alpha * UNIT_WEIGHT)
  return wetLengthPlusRun(membrane, 0.5, 0) - wetRun(membrane, 0.5, 0)
}

/** Largest distance of the dry side from the middle of the height, over the height. */
function drySideRadius(): number {
  const shape = standing(1, 15_000, 0.6)
  const outline = { shape, airPressure: 15_000, depth: 0.6, unitWeight: UNIT_WEIGHT }
  const { drySkin, crest } = loadedOutline(outline)
  const distances = drySkin.map(({ x, y }) => Math.hypot(x - crest.x, y - crest.y / 2))
  return Math.max(...distances) / crest.y
}

/** Cosine of the heel angle with the water at the crest: its sine from the product, second quadrant. */
function heelCosineAtCrest(alpha: number): number {
  return -Math.sqrt(1 - Math.min(1, weldAngles(dam(1, alpha * UNIT_WEIGHT), 0.5, 0).sinBeta) ** 2)
}

/** Printed −1/3 and the like, from 1/α − 1. */
const HEEL_COSINES = [
  [1.5, '-0.33333'],
  [2, '-0.50000'],
  [3, '-0.66667'],
] as const

const LOW_DAM = dam(0.8, 20_000)

/** Angle of the skin at the heel: its sine from the product, in the second quadrant [rad]. */
const heelAngle = (): number => Math.PI - Math.asin(weldAngles(LOW_DAM, 0.5, 0).sinBeta)

const CREST_ROWS = [
  [
    0.5,
    [
      [0.5, '0.987'],
      [1, '0.994'],
      [2, '0.997'],
      [5, '0.999'],
    ],
  ],
  [
    0.9,
    [
      [0.8, '0.906'],
      [1, '0.937'],
      [2, '0.975'],
      [5, '0.991'],
    ],
  ],
] as const

function crestRow([depth, crests]: (typeof CREST_ROWS)[number]): CheckRow {
  return {
    id: `crest-at-${depth}`,
    topic: 'loadedTube',
    title: `Crest over diameter at h/D ${depth}`,
    source: 'closed form, two programs',
    tag: 'derived',
    figures: crests.map(([ratio, printed]) =>
      figure(`p/(ρgD) ${ratio}`, printed, '–', () => standing(1, ratio * UNIT_WEIGHT, depth).crest),
    ),
  }
}

export const LOADED_TUBE_ROWS: readonly CheckRow[] = [
  {
    id: 'air-dam-crest',
    topic: 'loadedTube',
    title: 'Air dam with water at the crest, p = α γ H: wet length over height',
    source: 'theory: summary of Anwar 1967 (seen); lengths derived',
    tag: 'derived',
    figures: [
      figure('α 1', '1.31103', '–', () => wetLengthAtCrest(1)),
      figure('α 1.5', '1.30800', '–', () => wetLengthAtCrest(1.5)),
      figure('α 2', '1.31696', '–', () => wetLengthAtCrest(2)),
      figure('α 3', '1.33676', '–', () => wetLengthAtCrest(3)),
    ],
  },
  {
    id: 'air-dam-theory',
    topic: 'loadedTube',
    title: 'Air dam: T = pH/2, dry side a half circle of diameter H',
    source: 'summary of Anwar 1967',
    tag: 'published',
    figures: [
      figure('T/(pH)', '0.5', '–', () => {
        const { skinTension, crest } = standing(1, 15_000, 0.6)
        return skinTension / (15_000 * crest)
      }),
      figure('radius of the dry side over H', '0.5', '–', drySideRadius),
    ],
  },
  {
    id: 'air-dam-heel',
    topic: 'loadedTube',
    title: 'Air dam with water at the crest, p = α γ H: heel angle, cos θ = 1/α − 1',
    source: 'closed form',
    tag: 'derived',
    figures: HEEL_COSINES.map(([alpha, printed]) =>
      figure(`cos θ at α ${alpha}`, printed, '–', () => heelCosineAtCrest(alpha)),
    ),
  },
  {
    id: 'air-dam-below-crest',
    topic: 'loadedTube',
    title: 'Water below the crest, p 20 kPa, H 1.0 m, h 0.8 m, heel at the ground',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('T', '10.000', 'kN/m', () => (20_000 * 0.5) / 1000),
      figure('γh²/pH', '0.31392', '–', () => 2 * LOW_DAM.kappa * LOW_DAM.depth ** 2),
      figure('heel angle', '133.321', '°', () => (heelAngle() * 180) / Math.PI),
      figure('heel pull-up', '7.2753', 'kN/m', () => 10 * weldAngles(LOW_DAM, 0.5, 0).sinBeta),
      figure(
        'T (1 + cos θ), equal to γh²/2',
        '3.1392',
        'kN/m',
        () => 10 * (1 + Math.cos(heelAngle())),
      ),
    ],
  },
  {
    id: 'skirted-1.0-low',
    topic: 'loadedTube',
    title: 'Tube with skirt D 1.0 m, p 8 kPa, h 0.90 m',
    source: 'four routes, one to 30 digits',
    tag: 'derived',
    figures: [
      figure('T', '3639.357967', 'N/m', () => standing(1, 8000, 0.9).skinTension),
      figure('weld height', '0.05553634', 'm', () => standing(1, 8000, 0.9).weldHeight),
      figure('contact', '0.34644638', 'm', () => standing(1, 8000, 0.9).contact),
      figure('crest', '0.90983949', 'm', () => standing(1, 8000, 0.9).crest),
      figure('free skirt', '0.22707597', 'm', () => standing(1, 8000, 0.9).freeSkirt),
      figure('skirt pull', '3973.05', 'N/m', () => standing(1, 8000, 0.9).skirtTension),
    ],
  },
  {
    id: 'skirted-0.7',
    topic: 'loadedTube',
    title: 'Tube with skirt D 0.7 m, p 15 kPa, h 0.42 m',
    source: 'two programs',
    tag: 'derived',
    figures: [
      figure('T', '5225.09', 'N/m', () => standing(0.7, 15_000, 0.42).skinTension),
      figure('weld height', '0.07391', 'm', () => standing(0.7, 15_000, 0.42).weldHeight),
      figure('contact', '0.02381', 'm', () => standing(0.7, 15_000, 0.42).contact),
      figure('crest', '0.69668', 'm', () => standing(0.7, 15_000, 0.42).crest),
    ],
  },
  {
    id: 'skirted-0.5',
    topic: 'loadedTube',
    title: 'Tube with skirt D 0.5 m, p 25 kPa, h 0.45 m',
    source: 'two programs',
    tag: 'derived',
    figures: [
      figure('T', '6196.02', 'N/m', () => standing(0.5, 25_000, 0.45).skinTension),
      figure('weld height', '0.06499', 'm', () => standing(0.5, 25_000, 0.45).weldHeight),
      figure('contact', '0.02176', 'm', () => standing(0.5, 25_000, 0.45).contact),
      figure('crest', '0.49568', 'm', () => standing(0.5, 25_000, 0.45).crest),
    ],
  },
  ...CREST_ROWS.map(crestRow),
]
