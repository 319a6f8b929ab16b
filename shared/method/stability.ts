import { frictionResistance } from '../calc/section/friction-resistance'
import { evaluateSection } from '../checks/evaluate-section'
import { pondLimit } from '../checks/pond-limit'
import { justEnough } from '../checks/just-enough'
import { exampleSection } from '../verification/example-section'
import { worked, type Formula, type Given, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { mu, fall, Wb, U, F, FS, B, hd, Lw, h } = SYMBOLS
const tex = String.raw

const TUBE = {
  D: ['D', 0.7, 'm'],
  L: ['L', 2.2, 'm'],
  b: ['b', 0.12, 'm'],
  m: ['m', 4.8, 'kg/m'],
  mu: [tex`\mu`, 0.45, '–'],
  h: ['h', 0.55, 'm'],
} as const satisfies Record<string, Given>

type Tube = Readonly<Record<keyof typeof TUBE, number>>

const sectionOf = (x: Tube) =>
  exampleSection({
    barrier: { diameter: x.D, skirtLength: x.L, contactWidth: x.b, mass: x.m },
    ground: { friction: x.mu },
    water: { depth: x.h },
  })

const wet = symbol(
  tex`V_\mathrm{lift},\ V_\mathrm{dry}`,
  'Lift of the tube by wet and dry water',
  'N/m',
)

const CHECKS: readonly Formula[] = [
  {
    id: 'loads',
    title: 'All horizontal loads',
    tex: [
      tex`F = F_h + F_c + F_w + F_d - \tfrac{1}{2}\rho g\,h_d^2`,
      tex`M_F = F_h\tfrac{h}{3} + F_c\tfrac{h}{2} + M_w + F_d\,h - \tfrac{1}{2}\rho g\,h_d^2\,\tfrac{h_d}{3}`,
    ],
    symbols: [F, symbol('M_F', 'Their moment about the ground', 'N'), h, hd],
    assumptions: [
      'Where the dry water stands higher than the wet, the thrust points to the water: sliding, overturning and skirt are then not covered and fail.',
    ],
    source: 'closed form',
    tag: 'derived',
    worked: worked({ h: ['h', 0.55, 'm'], hd: ['h_d', 0.1, 'm'] }, (x) => {
      const { thrust } = evaluateSection(exampleSection({ water: { depth: x.h, dryDepth: x.hd } }))
      return [
        ['F', thrust.total, 'N/m'],
        ['M_F', thrust.total * (thrust.arm ?? 0), 'N'],
      ]
    }),
  },
  {
    id: 'sliding',
    title: 'Sliding',
    tex: [
      tex`N = \rho g\left(L_w h - \tfrac{1}{2}L_w^2\sin\beta\right) + (W_b - V_\mathrm{lift} - V_\mathrm{dry})\cos\beta - F\sin\beta - U`,
      tex`FS = \frac{\mu N}{F\cos\beta + (W_b - V_\mathrm{lift} - V_\mathrm{dry})\sin\beta}`,
    ],
    symbols: [symbol('N', 'Force that presses on the ground', 'N/m'), mu, Wb, wet, U, F, Lw, fall],
    assumptions: [
      'A rigid section. The pressure on the skirt is normal to the ground, so the water on it drives nothing.',
    ],
    source: 'equilibrium, derived',
    tag: 'derived',
    worked: worked(TUBE, (x) => {
      const { vertical, thrust, sliding } = evaluateSection(sectionOf(x))
      return [
        ['N', vertical.net, 'N/m'],
        ['F', thrust.total, 'N/m'],
        ['FS', sliding.factor ?? 0, '–'],
      ]
    }),
  },
  {
    id: 'soft-ground',
    title: 'Soft ground',
    tex: [tex`\text{resistance} = \min(\mu N,\; c_u B,\; 0.4\,N)`],
    symbols: [
      symbol('c_u', 'Undrained strength of the ground', 'Pa', 'above 0 to 1000000 Pa'),
      mu,
      symbol('N', 'Force that presses on the ground', 'N/m'),
      B,
    ],
    assumptions: [
      'Only where the undrained strength is entered. Flood water can always reach the interface, so the last bound always counts.',
      'For the skirt check the flat skirt takes the place of B. With partial factors c_u is divided by 1.4 in combination 2.',
    ],
    source: 'EN 1997-1:2004, 6.5.3 (from memory)',
    tag: 'memory',
    worked: worked(
      {
        mu: [tex`\mu`, 0.45, '–'],
        N: ['N', 4455, 'N/m'],
        cu: ['c_u', 500, 'Pa'],
        B: ['B', 2.32, 'm'],
      },
      (x) => {
        const ground = { ...exampleSection().ground, friction: x.mu, undrainedStrength: x.cu }
        const resistance = frictionResistance(ground, { normal: x.N, length: x.B })
        return [[tex`\text{resistance}`, resistance, 'N/m']]
      },
    ),
  },
  {
    id: 'overturning',
    title: 'Overturning about the dry toe, net',
    tex: [
      tex`FS = \frac{M_{Ww} + M_{Wb} - M_U}{M_F}, \qquad M_{Wb} = \tfrac{1}{2} W_b\,b`,
      tex`M_{Ww} = \rho g\left[h\left(bL_w + \tfrac{1}{2}L_w^2\right) - \sin\beta\left(\tfrac{1}{2}bL_w^2 + \tfrac{1}{3}L_w^3\right)\right] - \rho g M_o`,
    ],
    symbols: [
      symbol('M_{Ww},\\ M_{Wb}', 'Moments of the water on the skirt and of the own weight', 'N'),
      symbol('M_U,\\ M_F', 'Moments of uplift and of the horizontal loads', 'N'),
      Wb,
      Lw,
      fall,
    ],
    assumptions: [
      'The two faces of one membrane are one source, so the ratio is net. The lift by dry water is left out, which is safe.',
      'A limp skirt carries no base moment: net factors of 8 to 70 are normal, and this check seldom governs. Rolling is checked by the skirt check.',
    ],
    source: 'EN 1997-1, single source; moments derived',
    tag: 'derived',
    worked: worked(TUBE, (x) => {
      const { overturning, workings } = evaluateSection(sectionOf(x))
      return [
        [tex`M_{Ww} + M_{Wb} - M_U`, workings.overturning.resistance, 'N'],
        ['M_F', workings.overturning.demand, 'N'],
        ['FS', overturning.factor ?? 0, '–'],
      ]
    }),
  },
  {
    id: 'flotation',
    title: 'Flotation',
    tex: [tex`FS = \frac{W}{U}, \qquad W = W_w + W_b - V_\mathrm{dry}`],
    symbols: [symbol('W_w', 'Water on the skirt, less what the tube displaces', 'N/m'), Wb, U, wet],
    assumptions: ['Our own form, harsher than EM 1110-2-2100, eq. 3-2.'],
    source: 'equilibrium, derived',
    tag: 'derived',
    worked: worked(TUBE, (x) => {
      const { vertical, flotation } = evaluateSection(sectionOf(x))
      return [
        ['W', vertical.net + vertical.uplift, 'N/m'],
        ['U', vertical.uplift, 'N/m'],
        ['FS', flotation.factor ?? 0, '–'],
      ]
    }),
  },
]

const INFORMATION: readonly Formula[] = [
  {
    id: 'gross',
    title: 'Gross overturning ratio and resultant: information, not checks',
    tex: [
      tex`\text{gross} = \frac{M_{Ww} + M_{Wb}}{M_F + M_U}`,
      tex`x = \frac{M_{Ww} + M_{Wb} - M_U - M_F}{W - U}, \qquad \text{share} = \max\!\left(0, \min\!\left(1, \frac{3\min(x, B - x)}{B}\right)\right)`,
    ],
    symbols: [
      symbol('x', 'Resultant from the dry toe', 'm'),
      symbol(tex`\text{share}`, 'Share of a rigid base in compression', '–'),
      B,
    ],
    assumptions: [
      'Under full uplift and without own weight the gross ratio stays at or below 1.5 whatever the skirt.',
      'Nothing is given where W − U is not positive.',
    ],
    source: 'rigid base, derived',
    tag: 'derived',
    worked: worked(TUBE, (x) => {
      const { overturningGross, resultant } = evaluateSection(sectionOf(x))
      return [
        [tex`\text{gross}`, overturningGross ?? 0, '–'],
        ['x', resultant.x ?? 0, 'm'],
        [tex`\text{share}`, resultant.share ?? 0, '–'],
      ]
    }),
  },
  {
    id: 'just-enough',
    title: 'What is just enough against sliding',
    tex: [
      tex`L = \frac{FS\,F/(\mu\rho g) + A_o - W_b/(\rho g) + \tfrac{1}{2}\eta h b}{h\,(1 - \eta/2)}`,
      tex`\mu = \frac{FS\,F}{N}, \qquad \eta = \frac{2\,(W - FS\,F/\mu)}{\rho g h B}`,
    ],
    symbols: [FS, F, mu, symbol('A_o', 'Overhang of the tube under water', 'm²'), Wb, h, B],
    assumptions: [
      'The closed forms hold on level ground with r = ½ and no dry water. The program always finds the skirt as a root, and friction and η from the straight line that resistance follows; the forms are what it agrees with.',
      'An η of 1 or more: any edge will do. Nothing is given where no value in the range is enough.',
    ],
    source: 'equilibrium, derived',
    tag: 'derived',
    worked: worked({ ...TUBE, FS: ['FS', 1.5, '–'] }, (x) => {
      const enough = justEnough(sectionOf(x))
      return [
        ['L', enough.skirtLength ?? 0, 'm'],
        [tex`\mu`, enough.friction ?? 0, '–'],
        [tex`\eta`, enough.edgeFactor ?? 0, '–'],
      ]
    }),
  },
  {
    id: 'dry-water',
    title: 'Water that stands on the dry side',
    tex: [tex`V_\mathrm{dry} = \rho g\,A_o(h_d), \qquad U \text{ with } h_d > 0`],
    symbols: [hd, symbol(tex`A_o(h_d)`, 'Overhang of the tube under the dry water', 'm²')],
    assumptions: [
      'It pushes back a little, and takes far more of the friction resistance away: lift of the tube and uplift both grow.',
      'The most h_d is the dry water at which the first check fails, looked for at depths 0.005 D apart and refined.',
    ],
    source: 'equilibrium, derived',
    tag: 'derived',
    worked: worked({ ...TUBE, hd: ['h_d', 0.1, 'm'] }, (x) => {
      const dry = sectionOf(x)
      const ponded = { ...dry, water: { ...dry.water, dryDepth: x.hd } }
      const low = { ...dry, water: { ...dry.water, depth: 0.42 } }
      return [
        [tex`FS \text{ without}`, evaluateSection(dry).sliding.factor ?? 0, '–'],
        [tex`FS \text{ with}`, evaluateSection(ponded).sliding.factor ?? 0, '–'],
        [
          tex`\text{most } h_d \text{ at } h = 0.42\,\mathrm{m}`,
          pondLimit(low)?.dryDepth ?? 0,
          'm',
        ],
      ]
    }),
  },
]

/** A rigid section on the ground. */
export const STABILITY: MethodSection = {
  id: 'stability',
  title: 'Does it stay? The rigid section',
  intro: [
    'Grounds that the catalogue marks as unsuitable, loose gravel and bare mud, fail whatever the figures say.',
  ],
  formulas: [...CHECKS, ...INFORMATION],
}
