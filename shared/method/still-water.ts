import { stillWaterThrust } from '../calc/hydrostatics/still-water-thrust'
import { tubeOverhang } from '../calc/hydrostatics/tube-overhang'
import { sectionGeometry } from '../calc/section/section-geometry'
import { evaluateSection } from '../checks/evaluate-section'
import { exampleSection } from '../verification/example-section'
import { worked, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { h, rho, g, D, L, b, fall, Lw } = SYMBOLS
const tex = String.raw

/** Still water: what presses, and what stands on the skirt. */
export const STILL_WATER: MethodSection = {
  id: 'still-water',
  title: 'Still water',
  intro: [
    'The same water that presses the barrier sideways stands on its skirt and holds it down.',
  ],
  formulas: [
    {
      id: 'still-thrust',
      title: 'Thrust of still water',
      tex: [tex`F_h = \tfrac{1}{2}\,\rho g h^2 \qquad \text{at}\quad \frac{h}{3}`],
      symbols: [symbol('F_h', 'Thrust per metre run', 'N/m'), rho, g, h],
      assumptions: [
        'It does not depend on the shape of the face.',
        'Above the crest the same formula stays, which is safe.',
      ],
      source: 'Bansal, A Textbook of Fluid Mechanics, ch. 3, curved surfaces',
      tag: 'published',
      worked: worked(
        {
          rho: [tex`\rho`, 1000, 'kg/m³'],
          g: ['g', 9.81, 'm/s²'],
          h: ['h', 0.55, 'm'],
        },
        (x) => {
          const { force, moment } = stillWaterThrust(x.h, x.rho * x.g)
          return [
            ['F_h', force, 'N/m'],
            [tex`F_h\,h/3`, moment, 'N'],
          ]
        },
      ),
    },
    {
      id: 'geometry',
      title: 'Water on ground that falls',
      tex: [
        tex`h_e = \max(0,\; h - L \sin\beta)`,
        tex`L_w = \begin{cases} L & h \ge L\sin\beta \\ h / \sin\beta & \text{where the edge stays dry} \end{cases}`,
        tex`B = L + b`,
      ],
      symbols: [
        symbol('h_e', 'Depth at the wet edge of the skirt', 'm'),
        Lw,
        symbol('B', 'Base from the wet edge to the dry toe', 'm'),
        h,
        L,
        b,
        fall,
      ],
      assumptions: ['The crossfall is positive where the ground falls to the dry side.'],
      source: 'geometry',
      tag: 'derived',
      worked: worked(
        { h: ['h', 0.15, 'm'], L: ['L', 2.2, 'm'], fall: [tex`\tan\beta`, 0.1, '–'] },
        (x) => {
          const sine = x.fall / Math.hypot(1, x.fall)
          const section = exampleSection({
            barrier: { skirtLength: x.L },
            ground: { fall: x.fall },
            water: { depth: x.h },
          })
          const geometry = sectionGeometry(section)
          return [
            [tex`L \sin\beta`, x.L * sine, 'm'],
            ['h_e', geometry.edgeDepth, 'm'],
            ['L_w', geometry.wettedSkirt, 'm'],
            ['B', geometry.base, 'm'],
          ]
        },
      ),
    },
    {
      id: 'overhang',
      title: 'What the tube keeps off the skirt',
      tex: [
        tex`A_o = \int_0^{\min(h,D)} o\,\mathrm{d}y, \qquad M_o = \int_0^{\min(h,D)} o\left(b + \tfrac{o}{2}\right)\mathrm{d}y`,
        tex`o(y) = \max\!\left(0,\; \sqrt{\tfrac{D^2}{4} - \left(y - \tfrac{D}{2}\right)^2} - \tfrac{b}{2}\right)`,
        tex`V_\mathrm{lift} = \rho g A_o`,
      ],
      symbols: [
        symbol('A_o', 'Area of the tube beyond the weld line, under water', 'm²'),
        symbol('M_o', 'Its first moment about the dry toe', 'm³'),
        symbol(tex`V_\mathrm{lift}`, 'Lift of the tube by the water on the wet side', 'N/m'),
        D,
        b,
        h,
      ],
      assumptions: [
        'The tube is a circle here; its loaded shape is worked out further down.',
        'Both integrals are solved in closed form. No water is counted on top of the tube.',
        'Leaving the lift out overstates the friction resistance.',
      ],
      source: 'Bansal, prob. 3.31, for the lift of a cylinder on the ground; closed form derived',
      tag: 'derived',
      worked: worked({ D: ['D', 0.7, 'm'], b: ['b', 0.12, 'm'], h: ['h', 0.55, 'm'] }, (x) => {
        const { area, moment } = tubeOverhang(x.D, x.b, x.h)
        return [
          ['A_o', area, 'm²'],
          ['M_o', moment, 'm³'],
          [tex`V_\mathrm{lift}`, 9810 * area, 'N/m'],
        ]
      }),
    },
    {
      id: 'water-on-skirt',
      title: 'Water on the skirt',
      tex: [
        tex`W_w = \rho g \left( L_w h - \tfrac{1}{2} L_w^2 \sin\beta - A_o \right)`,
        tex`\text{anchoring mass of a section} = \ell\, W_w / g`,
      ],
      symbols: [
        symbol('W_w', 'Water on the skirt, less what the tube displaces', 'N/m'),
        symbol(tex`\ell`, 'Length of one section', 'm', '1 to 100 m'),
        Lw,
        fall,
        symbol('A_o', 'Area of the tube beyond the weld line, under water', 'm²'),
      ],
      assumptions: ['Pressure on the skirt is normal to the ground.'],
      source: 'closed form',
      tag: 'derived',
      worked: worked(
        {
          h: ['h', 0.55, 'm'],
          L: ['L', 2.2, 'm'],
          D: ['D', 0.7, 'm'],
          b: ['b', 0.12, 'm'],
          l: [tex`\ell`, 10, 'm'],
        },
        (x) => {
          const { vertical, anchoringMassPerSection } = evaluateSection(
            exampleSection({
              barrier: {
                diameter: x.D,
                skirtLength: x.L,
                contactWidth: x.b,
                sectionLength: x.l,
              },
              water: { depth: x.h },
            }),
          )
          return [
            ['W_w', vertical.waterOnSkirt, 'N/m'],
            [tex`\ell\,W_w/g`, anchoringMassPerSection, 'kg'],
          ]
        },
      ),
    },
  ],
}
