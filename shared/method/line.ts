import { lineSections } from '../calc/line/line-sections'
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
  ],
}
