import { resultant } from '../calc/section/resultant'
import { stillWaterThrust } from '../calc/hydrostatics/still-water-thrust'
import { upliftForce } from '../calc/uplift/uplift-force'
import { compare } from '../checks/compare'
import { evaluateSection } from '../checks/evaluate-section'
import { justEnough } from '../checks/just-enough'
import { UPL } from '../checks/partial-checks'
import type { SectionCase } from '../schemas/section-case'
import { figure, type CheckRow } from './check-row'
import { exampleSection } from './example-section'

const GAMMA = 9.81
const LINEAR = { model: 'linear', edgeFactor: 1, diffusivity: null, time: null } as const

/** A masonry section from the books: its weights and levers about the toe are given. */
interface MasonrySection {
  readonly depth: number
  readonly base: number
  readonly friction: number
  /** Weight and lever about the toe of each part, water on the heel included [kN/m, m]. */
  readonly parts: readonly (readonly [weight: number, lever: number])[]
}

/** Forces of a masonry section with full linear uplift, from the product's own functions. */
function masonry({ depth, base, friction, parts }: MasonrySection) {
  const thrust = stillWaterThrust(depth, GAMMA)
  const uplift = upliftForce({
    uplift: LINEAR,
    edgeDepth: depth,
    dryDepth: 0,
    base,
    unitWeight: GAMMA,
  })
  const weight = parts.reduce((sum, [part]) => sum + part, 0)
  const moment = parts.reduce((sum, [part, lever]) => sum + part * lever, 0)
  const net = weight - uplift.force
  const place = resultant(moment - uplift.moment - thrust.moment, net, base)
  return {
    uplift: uplift.force,
    net,
    sliding: compare({ demand: thrust.force, resistance: friction * net }, 1.5).factor!,
    gross: moment / (thrust.moment + uplift.moment),
    x: place.x!,
    eccentricity: base / 2 - place.x!,
  }
}

/** Crest 1 m, batters 1.0 and 6.25 m, 22.4 kN/m³; the last part is the water on the wet batter. */
const section10 = () =>
  masonry({
    depth: 10,
    base: 8.25,
    friction: 0.75,
    parts: [
      [22.4 * 10, 6.75],
      [22.4 * 5, 7.25 + 1 / 3],
      [22.4 * 31.25, (6.25 * 2) / 3],
      [GAMMA * 5, 8.25 - 1 / 3],
    ],
  })

/** Crest 1.5 m, vertical wet face, 20 kN/m³. */
const section6 = () =>
  masonry({
    depth: 6,
    base: 4.94,
    friction: 0.6,
    parts: [
      [20 * 1.5 * 6, 4.94 - 0.75],
      [(20 * 3.44 * 6) / 2, (3.44 * 2) / 3],
    ],
  })

/** A weightless tube on a plain friction of 0.4, as the derived rows have it. */
function bareTube(radius: number, depth: number, skirtLength: number, model: 'linear' | 'none') {
  return exampleSection({
    barrier: { diameter: 2 * radius, skirtLength, contactWidth: 0, mass: 0 },
    ground: { friction: 0.4 },
    water: { depth },
    uplift: { model },
  })
}

const sliding = (section: SectionCase): number => evaluateSection(section).sliding.factor!

const anchoring = (section: SectionCase): number => evaluateSection(section).anchoringMassPerSection

const IRRIGATION = 'irrigation-engineering worked examples, archive FOSSEE, book 2087'

export const STABILITY_ROWS: readonly CheckRow[] = [
  {
    id: 'masonry-10',
    topic: 'stability',
    title: 'Gravity section H 10 m, base 8.25 m, full linear uplift, 22.4 kN/m³, μ 0.75',
    source: `${IRRIGATION}, Ex 8.14`,
    tag: 'published',
    figures: [
      figure('uplift', '404.66', 'kN/m', () => section10().uplift),
      figure('ΣV', '680.39', 'kN/m', () => section10().net),
      figure('sliding', '1.0403', '–', () => section10().sliding),
      figure('overturning, gross', '1.4677', '–', () => section10().gross),
      figure('resultant from the toe', '2.6539', 'm', () => section10().x),
      figure('eccentricity', '1.4711', 'm', () => section10().eccentricity),
    ],
  },
  {
    id: 'masonry-6',
    topic: 'stability',
    title: 'Gravity section H = water = 6 m, base 4.94 m, crest 1.5 m, 20 kN/m³, μ 0.6',
    source: `${IRRIGATION}, Ex 8.10`,
    tag: 'published',
    figures: [
      figure('ΣV', '241.0', 'kN/m', () => section6().net),
      figure('sliding', '0.819', '–', () => section6().sliding),
    ],
  },
  {
    id: 'bare-tube',
    topic: 'stability',
    title: 'Tube R 0.5 m, depth 0.8 m, skirt 3 m, strip 0, μ 0.4, linear uplift, weightless',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('N', '8.468', 'kN/m', () => {
        return evaluateSection(bareTube(0.5, 0.8, 3, 'linear')).vertical.net / 1000
      }),
      figure('sliding', '1.0790', '–', () => sliding(bareTube(0.5, 0.8, 3, 'linear'))),
      figure('sliding if the lift of the tube is forgotten', '1.500', '–', () => {
        const { vertical, thrust } = evaluateSection(bareTube(0.5, 0.8, 3, 'linear'))
        return (0.4 * (vertical.net + vertical.lift)) / thrust.total
      }),
      figure('skirt for 1.5', '3.842', 'm', () => {
        return justEnough(bareTube(0.5, 0.8, 3, 'linear')).skirtLength!
      }),
    ],
  },
  {
    id: 'bare-tube-variants',
    topic: 'stability',
    title: 'The same without uplift; with a skirt of 4 m; R 0.75 m, depth 1.2 m, skirt 5 m',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('without uplift', '2.5790', '–', () => sliding(bareTube(0.5, 0.8, 3, 'none'))),
      figure('skirt 4 m', '1.5790', '–', () => sliding(bareTube(0.5, 0.8, 4, 'linear'))),
      figure('R 0.75 m', '1.2457', '–', () => sliding(bareTube(0.75, 1.2, 5, 'linear'))),
    ],
  },
  {
    id: 'anchoring-070',
    topic: 'stability',
    title: 'Tube 0.70 m, skirt 2.2 m, strip 0.12 m, 10 m long, 48 kg, 0.55 m of water',
    source: 'closed form',
    tag: 'derived',
    figures: [figure('anchoring water', '10807', 'kg', () => anchoring(exampleSection()))],
  },
  {
    id: 'anchoring-075',
    topic: 'stability',
    title:
      'A section 0.75 m high, 10 m long, 50 kg: skirts of 1.65 m and more are anchored by 10 t',
    source: 'common practice, no source',
    tag: 'practice',
    figures: [
      figure('anchoring water', '10166', 'kg', () =>
        anchoring(
          exampleSection({
            barrier: { diameter: 0.75, skirtLength: 1.65, contactWidth: 0, mass: 5 },
            water: { depth: 0.75 },
          }),
        ),
      ),
    ],
  },
  {
    id: 'upl',
    topic: 'stability',
    title: 'UPL: 1324.4 kN/m up against 1068 kN/m, recommended partial factors 1.0 and 0.9',
    source: 'Bond & Harris, Decoding Eurocode 7, ch. 7',
    tag: 'published',
    figures: [
      figure('utilisation', '138', '%', () => {
        const demand = UPL.unfavourable * 1324.4
        const resistance = UPL.favourable * 1068
        return 100 * compare({ demand, resistance }, 1).utilisation!
      }),
    ],
  },
]
