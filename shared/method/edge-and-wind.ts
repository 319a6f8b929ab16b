import { bend, stepArea } from '../calc/line/bend'
import { edgeBallast } from '../calc/moving-water/edge-ballast'
import { windOnEmptyBarrier } from '../calc/wind/wind-on-empty-barrier'
import { worked, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { rho, g, D, L, mu, m, FS } = SYMBOLS
const tex = String.raw

/** Edge, bends, steps in size, and wind before the water comes. */
export const EDGE_AND_WIND: MethodSection = {
  id: 'edge',
  title: 'Edge, bends, and wind before the water comes',
  intro: [
    'Ballast and closures are demands, not gates. The skirt that is missing at a bend counts in the sections beside it.',
  ],
  formulas: [
    {
      id: 'edge-ballast',
      title: 'Ballast of the wet edge in a current along the line',
      tex: [
        tex`m_e = \frac{\tfrac{1}{2}\,\rho V^2 a\,c_L}{g\,(1 - \rho/\rho_b)}, \qquad a = 0.3\ \text{m},\quad c_L = 1`,
      ],
      symbols: [
        symbol('V', 'Speed along the line', 'm/s'),
        symbol(tex`\rho_b`, 'Density of the ballast, heavier than water', 'kg/m³'),
        rho,
        g,
      ],
      assumptions: ['Height of edge and lift coefficient are judgement.'],
      source: 'common practice, no source',
      tag: 'practice',
      worked: worked(
        {
          V: ['V', 1, 'm/s'],
          rho: [tex`\rho`, 1000, 'kg/m³'],
          ballast: [tex`\rho_b`, 1800, 'kg/m³'],
          g: ['g', 9.81, 'm/s²'],
        },
        (x) => {
          const current = { speed: x.V, density: x.rho, ballastDensity: x.ballast, gravity: x.g }
          return [['m_e', edgeBallast(current), 'kg/m']]
        },
      ),
    },
    {
      id: 'bend',
      title: 'A bend at a joint',
      tex: [
        tex`\text{outer gap} = 2D\sin\frac{\theta}{2}, \qquad \text{missing skirt} = \tfrac{1}{2}L^2\theta`,
        tex`\text{lost share of each section} = \frac{\tfrac{1}{2}L^2\theta}{2L\,\ell}`,
      ],
      symbols: [
        symbol(tex`\theta`, 'Turn at one closure', 'rad'),
        symbol(tex`\ell`, 'Length of one section', 'm', '1 to 100 m'),
        D,
        L,
      ],
      assumptions: [
        'Only a turn away from the water, to the left with the water on the right, opens the skirt; a turn towards it folds it.',
        'A turn beyond the limit of one closure, with 0.5° tolerance, is divided equally among closures. The missing sector is that of the whole turn, shared by both sections.',
      ],
      source: 'geometry',
      tag: 'derived',
      worked: worked(
        {
          angle: [tex`\theta`, 0.5236, 'rad'],
          D: ['D', 0.7, 'm'],
          L: ['L', 2.2, 'm'],
          l: [tex`\ell`, 10, 'm'],
          limit: [tex`\theta_\mathrm{max}`, 0.7854, 'rad'],
        },
        (x) => {
          const answer = bend({
            angle: x.angle,
            diameter: x.D,
            skirtLength: x.L,
            sectionLength: x.l,
            largestTurn: x.limit,
          })
          return [
            [tex`\text{closures}`, answer.closures, '–'],
            [tex`\text{outer gap}`, answer.outerGap, 'm'],
            [tex`\text{missing skirt}`, answer.missingSkirt, 'm²'],
            [tex`\text{lost share}`, answer.lostShare, '–'],
          ]
        },
      ),
    },
    {
      id: 'step',
      title: 'A step in size',
      tex: [tex`A = \frac{\pi\,(D_1^2 - D_2^2)}{4}`],
      symbols: [symbol('A', 'End area that is left to close', 'm²'), D],
      assumptions: ['Both neighbours at their full diameter.'],
      source: 'geometry',
      tag: 'derived',
      worked: worked({ D1: ['D_1', 1, 'm'], D2: ['D_2', 0.7, 'm'] }, (x) => [
        ['A', stepArea(x.D1, x.D2), 'm²'],
      ]),
    },
    {
      id: 'wind',
      title: 'Wind on the empty barrier',
      tex: [
        tex`F = \tfrac{1}{2}\rho_a v^2 c_f D, \qquad m_b = \max\!\left(0,\; \frac{FS\,F}{\mu g} - m\right)`,
      ],
      symbols: [
        symbol('v', 'Peak gust', 'm/s', '0 to 60 m/s'),
        symbol(tex`\rho_a,\ c_f`, 'Density of air 1.25, force coefficient 1.2', 'kg/m³, –'),
        symbol('m_b', 'Ballast on the skirt', 'kg/m'),
        FS,
        mu,
        m,
        D,
      ],
      assumptions: [
        'Required factor of sliding of the basis; 1.5 with partial factors. Ballast is almost always needed.',
      ],
      source: 'form of EN 1991-1-4; coefficients common practice, no source',
      tag: 'practice',
      worked: worked(
        {
          v: ['v', 15, 'm/s'],
          D: ['D', 0.7, 'm'],
          m: ['m', 4.8, 'kg/m'],
          mu: [tex`\mu`, 0.45, '–'],
          FS: ['FS', 1.5, '–'],
        },
        (x) => {
          const wind = windOnEmptyBarrier({
            diameter: x.D,
            mass: x.m,
            friction: x.mu,
            gravity: 9.81,
            gust: x.v,
            required: x.FS,
          })
          return [
            ['F', wind.force, 'N/m'],
            ['m_b', wind.ballast, 'kg/m'],
          ]
        },
      ),
    },
  ],
}
