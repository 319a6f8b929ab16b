import { gapFlow } from '../calc/ground/gap-flow'
import { groundSeepage } from '../calc/ground/ground-seepage'
import { criticalGradient, pipingScreen } from '../calc/ground/piping-screen'
import { rationalRunoff } from '../calc/ground/rational-runoff'
import { inflowOf } from '../calc/dry-side/inflow'
import { worked, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { B, g } = SYMBOLS
const tex = String.raw

const head = symbol('h', 'Head between wet and dry side', 'm')

/** What reaches the dry side. */
export const DRY_SIDE: MethodSection = {
  id: 'dry-side',
  title: 'What reaches the dry side',
  intro: [
    'Waves and water over the crest, further up, come to it as well. Each way can be plugged, or the line moved past it: then it lets nothing through.',
  ],
  formulas: [
    {
      id: 'seepage',
      title: 'Through the ground',
      tex: [
        tex`q = k\,h\,\frac{\operatorname{agm}(1, \operatorname{sech} x)}{2\operatorname{agm}(1, \tanh x)}, \qquad x = \frac{\pi B}{4T_l}`,
      ],
      symbols: [
        symbol('q', 'Flow per metre run', 'm²/s'),
        symbol('k', 'Permeability', 'm/s', '0 to 1 m/s'),
        symbol('T_l', 'Thickness of the pervious layer', 'm', 'above 0 m'),
        symbol(tex`\operatorname{agm}`, 'Arithmetic–geometric mean', '–'),
        head,
        B,
      ],
      assumptions: [
        'One uniform layer on an impervious one, a flat impervious base, steady flow: then exact for every B/T_l.',
        'In a section the head is h − h_d, 0 if negative.',
      ],
      source: 'Pavlovsky and Harr (from memory); conformal map derived',
      tag: 'derived',
      worked: worked(
        {
          k: ['k', 1e-4, 'm/s'],
          h: ['h', 1, 'm'],
          B: ['B', 4, 'm'],
          T: ['T_l', 4, 'm'],
        },
        (x) => {
          const ground = { permeability: x.k, head: x.h, baseWidth: x.B, layerThickness: x.T }
          const q = groundSeepage(ground)
          return [
            ['q', q, 'm²/s'],
            ['q', q * 3.6e6, 'l/h per m'],
          ]
        },
      ),
    },
    {
      id: 'gap',
      title: 'Through a gap under the skirt',
      tex: [
        tex`q = \min\left(\frac{g\,w^3\,i}{12\,\nu},\;\; 0.61\,w\sqrt{2gh}\right), \qquad i = \frac{h}{\text{path}}, \qquad Re = \frac{q_\text{laminar}}{\nu}`,
      ],
      symbols: [
        symbol('q', 'Flow per metre of gap', 'm²/s'),
        symbol('w', 'Height of the gap', 'm'),
        symbol(tex`\nu`, 'Kinematic viscosity', 'm²/s'),
        symbol(tex`\text{path}`, 'Length of the way under the skirt', 'm'),
        head,
        g,
      ],
      assumptions: [
        'Laminar between plates, limited by what a sharp slot lets through. One millimetre of crease matters: the flow grows with its cube.',
      ],
      source: 'laminar flow between plates; slot coefficient 0.61 (from memory)',
      tag: 'derived',
      worked: worked(
        {
          w: ['w', 0.001, 'm'],
          h: ['h', 0.1, 'm'],
          path: [tex`\text{path}`, 1, 'm'],
          nu: [tex`\nu`, 1.3063e-6, 'm²/s'],
        },
        (x) => {
          const gap = { width: x.w, head: x.h, path: x.path, viscosity: x.nu, gravity: 9.81 }
          const { perMetre, reynolds } = gapFlow(gap)
          return [
            ['q', perMetre * 3.6e6, 'l/h per m'],
            ['Re', reynolds, '–'],
          ]
        },
      ),
    },
    {
      id: 'ways',
      title: 'Joints, gullies, an open end',
      tex: [
        tex`H = z_w - \max(z_g, z_p)`,
        tex`Q_\text{joint} = c_j H, \qquad Q_\text{opening} = C A\sqrt{2gH}`,
        tex`Q_\text{end} = \begin{cases} w\left(\tfrac{2}{3}\right)^{1.5}\sqrt{g}\,H_s^{1.5} & h_p \le \tfrac{2}{3}H_s \\ w\,h_p\sqrt{2g(H_s - h_p)} & \text{above} \end{cases}`,
      ],
      symbols: [
        symbol('z_w,\\ z_p', 'Level of the water and of the pond', 'm'),
        symbol('z_g', 'Ground beside the joint, or invert of the opening', 'm'),
        symbol('c_j', 'Flow of the joints per metre of head', 'm²/s'),
        symbol('C,\\ A', 'Discharge coefficient and area of the opening', '–, m²'),
        symbol('w', 'Width of the open end', 'm'),
        symbol('H_s,\\ h_p', 'Water and pond over the sill of the open end', 'm'),
      ],
      assumptions: [
        'A pond that stands higher sends nothing back. Springs and wells bring their flow once the water stands above a level; brooks and ground water by time.',
        'Flow of joints: no source, enter what was measured.',
      ],
      source: 'orifice and broad crest; joints common practice, no source',
      tag: 'practice',
      worked: worked(
        {
          water: ['z_w', 3.4, 'm'],
          pond: ['z_p', 2.9, 'm'],
          ground: ['z_g', 2.87, 'm'],
          joint: ['c_j', 0.001, 'm²/s'],
          C: ['C', 0.6, '–'],
          A: ['A', 0.02, 'm²'],
          w: ['w', 1.5, 'm'],
        },
        (x) => {
          const at = { time: 0, waterLevel: x.water, pondLevel: x.pond, gravity: 9.81 }
          const joint = { kind: 'joint', name: '', flowPerHead: x.joint } as const
          const opening = { kind: 'opening', name: '', area: x.A, coefficient: x.C } as const
          const end = { kind: 'open-end', name: '', width: x.w, sill: x.ground } as const
          return [
            [tex`Q_\text{joint}`, inflowOf({ ...joint, groundLevel: x.ground }, at), 'm³/s'],
            [tex`Q_\text{opening}`, inflowOf({ ...opening, invert: x.ground }, at), 'm³/s'],
            [tex`Q_\text{end}`, inflowOf(end, at), 'm³/s'],
          ]
        },
      ),
    },
    {
      id: 'rain',
      title: 'Rain',
      tex: [tex`Q = C\,i\,A`],
      symbols: [
        symbol('C', 'Runoff coefficient', '–', '0 to 1'),
        symbol('i', 'Intensity of the rain', 'm/s'),
        symbol('A', 'Catchment of the dry side', 'm²'),
      ],
      assumptions: ['The rational method: the peak, as if the rain lasts.'],
      source: 'rational method, worked examples of urban drainage',
      tag: 'published',
      worked: worked({ C: ['C', 0.9, '–'], i: ['i', 50, 'mm/h'], A: ['A', 2000, 'm²'] }, (x) => [
        ['Q', rationalRunoff(x.C, x.i / 3.6e6, x.A), 'm³/s'],
      ]),
    },
    {
      id: 'piping',
      title: 'Piping: a screening, never a gate',
      tex: [
        tex`i = \frac{4}{\pi}\operatorname{Re}\arccos\!\left(1 + \tfrac{\mathrm{i}}{2}\right)\frac{h}{B} = 0.859\,295\,17\,\frac{h}{B}`,
        tex`\text{Bligh: } \frac{B}{h}, \qquad \text{Lane: } \frac{B}{3h}, \qquad i_c = \frac{G_s - 1}{1 + e}`,
      ],
      symbols: [
        symbol('i', 'Exit gradient, averaged over a depth of B/4', '–'),
        symbol('i_c', 'Critical gradient of the soil', '–'),
        symbol('G_s,\\ e', 'Specific gravity of the grains, void ratio', '–'),
        head,
        B,
      ],
      assumptions: [
        'Deep uniform sand. The ratios of Bligh and Lane were fitted to permanent weirs on bare alluvium.',
      ],
      source: 'conformal map, derived; Bligh, and Lane 1935 (from memory)',
      tag: 'derived',
      worked: worked(
        {
          h: ['h', 0.55, 'm'],
          B: ['B', 2.32, 'm'],
          G: ['G_s', 2.65, '–'],
          e: ['e', 0.65, '–'],
        },
        (x) => {
          const screen = pipingScreen(x.h, x.B)
          return [
            ['i', screen.exitGradient, '–'],
            ['B/h', screen.bligh ?? 0, '–'],
            ['B/3h', screen.lane ?? 0, '–'],
            ['i_c', criticalGradient(x.G, x.e), '–'],
          ]
        },
      ),
    },
  ],
}
