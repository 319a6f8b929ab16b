import { lineSections } from '../calc/line/line-sections'
import { CHANGE_MASS, chooseSizes, sizesCost } from '../checks/layout/choose-sizes'
import { lineTurns } from '../calc/line/line-turns'
import type { Station } from '../schemas/line'
import { worked, type MethodSection } from './formula'
import { symbol } from './symbols'

const tex = String.raw

/** Three stations with one turn in the middle, 5 cm of fall along each leg. */
function corner(first: number, second: number, turnDeg: number): readonly Station[] {
  const turn = (turnDeg * Math.PI) / 180
  const station = { surface: 'turf', clearWidth: null, note: '' }
  return [
    { ...station, chainage: 0, x: 0, y: 0, groundLevel: 3.05 },
    { ...station, chainage: first, x: first, y: 0, groundLevel: 3 },
    {
      ...station,
      chainage: first + second,
      x: first + second * Math.cos(turn),
      y: second * Math.sin(turn),
      groundLevel: 2.95,
    },
  ]
}

/** How a surveyed line becomes sections. */
export const LINE: MethodSection = {
  id: 'line',
  title: 'A line of sections',
  intro: [
    'A section is its worst piece, a line its worst section; the section that gives way at the lowest level is the weakest.',
  ],
  formulas: [
    {
      id: 'sections',
      title: 'Sections of a run',
      tex: [
        tex`n = \left\lceil \frac{\text{run}}{\ell} \right\rceil, \qquad \text{depth} = \text{level} - \text{lowest ground of the piece}`,
      ],
      symbols: [
        symbol('n', 'Sections in a run, laid from its lower chainage', '–'),
        symbol(tex`\text{run}`, 'Line between two turns of 5° or more, or its ends', 'm'),
        symbol(
          tex`\ell`,
          'Length of one section, the same for all sizes of a line',
          'm',
          '1 to 100 m',
        ),
      ],
      assumptions: [
        'Turns below 5° are survey noise. The ground is linear between stations; a section is cut into pieces of one surface, each with its own lowest ground.',
        'A line with one station is one section.',
      ],
      source: 'definition',
      tag: 'derived',
      worked: worked(
        {
          first: [tex`\text{leg 1}`, 42, 'm'],
          second: [tex`\text{leg 2}`, 25, 'm'],
          turn: [tex`\text{turn}`, 30, '°'],
          l: [tex`\ell`, 10, 'm'],
        },
        (x) => {
          const stations = corner(x.first, x.second, x.turn)
          const sections = lineSections(stations, x.l)
          const grounds = sections.flatMap(({ pieces }) => pieces.map((p) => p.lowestGround))
          return [
            [tex`\text{turns}`, lineTurns(stations).length, '–'],
            ['n', sections.length, '–'],
            [tex`\text{lowest ground}`, Math.min(...grounds), 'm'],
          ]
        },
      ),
    },
    {
      id: 'layout',
      title: 'A size for every section',
      tex: [tex`\min \sum m_i\,\ell + 20\ \text{kg} \times \text{changes}`],
      symbols: [
        symbol('m_i', 'Mass of the size of a section', 'kg/m'),
        symbol(tex`\text{changes}`, 'Joints between two different sizes', '–'),
      ],
      assumptions: [
        'Among sizes with which every check holds and which are not wider than the clear width. Joints that step over a size are avoided first.',
        'Optimal: dynamic programming over sections and sizes. Where no size holds, the one that holds to the highest level is laid and marked as not holding. The stock is compared afterwards.',
      ],
      source: 'weight of a change: judgement, no source',
      tag: 'practice',
      worked: worked(
        {
          small: [tex`m_1\,\ell`, 48, 'kg'],
          large: [tex`m_2\,\ell`, 78, 'kg'],
        },
        (x) => {
          const either = { candidates: [0, 1] }
          const onlyLarge = { candidates: [1] }
          const masses = [x.small, x.large]
          const sizes = chooseSizes([either, onlyLarge, either, onlyLarge, either, either], masses)
          const changes = sizes.filter((size, i) => i > 0 && size !== sizes[i - 1]).length
          return [
            [tex`\text{changes}`, changes, '–'],
            [tex`\text{least}`, sizesCost(sizes, masses).mass, 'kg'],
            [tex`\text{for a change}`, CHANGE_MASS, 'kg'],
          ]
        },
      ),
    },
  ],
}
