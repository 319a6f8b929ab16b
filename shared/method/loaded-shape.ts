import { loadedShape, type StandingShape } from '../calc/loaded-shape/loaded-shape'
import { freeSkirt } from '../calc/loaded-shape/free-skirt'
import { evaluateSection } from '../checks/evaluate-section'
import { seatCheck } from '../checks/seat-check'
import { exampleSection } from '../verification/example-section'
import { worked, type Given, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { rho, g, h, D, p, mu, Lw, F } = SYMBOLS
const tex = String.raw

const T = symbol('T', 'Tension of the skin', 'N/m')
const yA = symbol('y_A', 'Height of the weld line', 'm')
const Ts = symbol('T_s', 'Pull of the skirt', 'N/m')

const TUBE = {
  D: ['D', 0.7, 'm'],
  p: ['p', 15_000, 'Pa'],
  L: ['L_w', 2.2, 'm'],
  h: ['h', 0.55, 'm'],
} as const satisfies Record<string, Given>

type Tube = Readonly<Record<keyof typeof TUBE, number>>

/** The shape of the worked tube; it stands, or the figure is a mistake. */
function standing(x: Tube): StandingShape {
  const shape = loadedShape({
    diameter: x.D,
    airPressure: x.p,
    wettedSkirt: x.L,
    depth: x.h,
    unitWeight: 9810,
  })
  if (!shape.solved) throw new Error(`no shape stands: ${shape.reason}`)
  return shape
}

/** The tube as it stands under load. */
export const LOADED_SHAPE: MethodSection = {
  id: 'loaded-shape',
  title: 'The shape in which the tube stands',
  intro: [
    'Weightless, inextensible membranes at one air pressure, on a frictionless seat: the skirt alone anchors the tube. Level ground, no water on the dry side, a drained void under the lifted skirt.',
    'Everything scales with D and ρgD: one chart, further down, shows the crest of every such tube.',
  ],
  formulas: [
    {
      id: 'free-skirt',
      title: 'The lifted skirt',
      tex: [
        tex`T_s = \tfrac{1}{2}\rho g h^2, \qquad \cos\varphi = \left(1 - \frac{y}{h}\right)^2`,
        tex`\text{free skirt} = \int_0^{y_A} \frac{\mathrm{d}y}{\sqrt{1 - (1 - y/h)^4}}`,
      ],
      symbols: [Ts, symbol(tex`\varphi`, 'Slope of the skirt at the height y', 'rad'), yA, h],
      assumptions: ['It leaves the ground tangentially.'],
      source: 'membrane theory, derived',
      tag: 'derived',
      worked: worked({ h: ['h', 0.55, 'm'], y: ['y_A', 0.06, 'm'] }, (x) => [
        ['T_s', 4905 * x.h ** 2, 'N/m'],
        [tex`\text{free skirt}`, freeSkirt(x.h, x.y).length, 'm'],
      ]),
    },
    {
      id: 'shape',
      title: 'Balance of the weld line, and the length of the skin',
      tex: [
        tex`\cos\alpha = 1 - \frac{p\,y_A}{T}, \qquad \cos\beta_A = -1 + \frac{p\,y_A + \tfrac{1}{2}\rho g w^2}{T}, \qquad w = h - y_A`,
        tex`\cos\beta(y) = \cos\beta_A + \frac{p\,(y - y_A) - \tfrac{1}{2}\rho g\left[w^2 - (h - y)^2\right]}{T}`,
        tex`T\sin\beta_A - T\sin\alpha - T_s\sin\varphi_A = 0, \qquad \text{length of the skin} = \pi D`,
        tex`\text{crest} = \frac{2T}{p}`,
      ],
      symbols: [
        T,
        Ts,
        yA,
        symbol(tex`\alpha,\ \beta_A`, 'Angles of the skin below and above the weld line', 'rad'),
        p,
        D,
        rho,
        g,
        h,
      ],
      assumptions: [
        'Arcs of radius T/p under the weld line and above the water, exactly a half circle on the dry side.',
        'For one crest the weld balance has one root; the length that is left over has one root on the standing branch. Both are bracketed before they are searched, so that no search leaves the branch.',
        'It does not stand: no skirt; overtopped, where the residual at a crest of h is not negative; gives way, where no contact is left, the lifted skirt is as long as the wet one, or, below p/(ρgD) 0.463, the branch has ended.',
      ],
      source:
        'after the theory of inflatable dams, Anwar 1967 (from memory); form with a skirt derived',
      tag: 'derived',
      worked: worked(TUBE, (x) => {
        const shape = standing(x)
        return [
          ['T', shape.skinTension, 'N/m'],
          ['y_A', shape.weldHeight, 'm'],
          [tex`\text{crest}`, shape.crest, 'm'],
          [tex`\text{contact}`, shape.contact, 'm'],
          [tex`\text{free skirt}`, shape.freeSkirt, 'm'],
        ]
      }),
    },
    {
      id: 'skirt-check',
      title: 'Skirt pull: does the flat skirt hold it?',
      tex: [
        tex`L_f = L_w - \text{free skirt}, \qquad R = \mu\left(\rho g h\,L_f - U_f\right), \qquad FS = \frac{R}{F}`,
      ],
      symbols: [
        symbol('L_f', 'Skirt that stays flat', 'm'),
        symbol('U_f', 'Water under it, with the edge pressure η ρ g h', 'N/m'),
        Lw,
        mu,
        F,
      ],
      assumptions: [
        'A gate, required as for sliding: this is the check against rolling. On short skirts it governs where rigid sliding passes.',
        'Where no shape stands, or nothing stays flat, the resistance is 0. On soft ground it is bounded as for sliding.',
      ],
      source: 'equilibrium, derived',
      tag: 'derived',
      worked: worked({ ...TUBE, mu: [tex`\mu`, 0.45, '–'] }, (x) => {
        const { loadedShape: shape, skirt } = evaluateSection(
          exampleSection({
            barrier: { diameter: x.D, airPressure: x.p, skirtLength: x.L },
            ground: { friction: x.mu },
            water: { depth: x.h },
          }),
        )
        const flat = shape.solved ? x.L - shape.freeSkirt : 0
        return [
          ['L_f', flat, 'm'],
          ['R', shape.solved ? shape.skirtGrip : 0, 'N/m'],
          ['FS', skirt.factor ?? 0, '–'],
        ]
      }),
    },
    {
      id: 'seat-pressure',
      title: 'Pressure in the void under the lifted skirt',
      tex: [
        tex`\cos\varphi = \left(1 - \frac{y}{h}\right)^2 + \frac{2\,u\,y}{\rho g h^2}, \qquad \text{arc under the weld of radius } \frac{T}{p - u}`,
        tex`u_m = u_s \left(1 + \frac{m g}{p\,c}\right), \qquad \text{the tube gives way} \iff u_p > u_m`,
      ],
      symbols: [
        symbol('u', 'Pressure in the void', 'Pa'),
        symbol('u_s', 'Seat pressure: the u at which the contact vanishes', 'Pa'),
        symbol('u_m', 'The same with the own weight of the tube on the seat', 'Pa'),
        symbol('c', 'Contact width, drained', 'm'),
        symbol('u_p', 'Uplift at the point at which the skirt peels off', 'Pa'),
      ],
      assumptions: [
        'A skirt that leaks over a seat that seals is not safe. Where the uplift at the point at which the skirt peels off is larger than the seat bears, the tube gives way: the part “Air” of the cross-section then comes to the front and says so.',
        'The membrane has no weight, so in a film of water it has no contact and bears nothing; there the own weight keeps the seat. It is counted to first order: it rests on the same seat as p c, the weight of the water on tube and lifted skirt.',
        'It is no check and no part of holds-to. On level ground without water on the dry side, with the even or the developing uplift and friction up to 0.9, no section that meets all its checks loses its seat: sliding, flotation or skirt pull fail first (a property test draws them). With the deep uplift, on a slope, and above all with water standing on the dry side, for which the loaded shape is not derived, it can: then it is a warning beside checks that are met.',
      ],
      source: 'membrane theory, derived',
      tag: 'derived',
      worked: worked(TUBE, (x) => {
        const section = exampleSection({
          barrier: { diameter: x.D, airPressure: x.p, skirtLength: x.L },
          water: { depth: x.h },
        })
        const seat = seatCheck(section)
        const head = section.water.density * section.gravity * x.h
        return [
          ['u_s', seat?.limit ?? 0, 'Pa'],
          [tex`u_s/(\rho g h)`, (seat?.limit ?? 0) / head, '–'],
          ['u_m', seat?.limitWithWeight ?? head, 'Pa'],
          ['u_p', seat?.atPeel ?? 0, 'Pa'],
        ]
      }),
    },
  ],
}
