import { checkSection } from '../checks/section-check'
import { evaluateSection } from '../checks/evaluate-section'
import { leaveLevel } from '../checks/leave-level'
import { compare } from '../checks/compare'
import { exampleSection } from '../verification/example-section'
import { worked, type Formula, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { h, Hs, V, g, F, Wb, U, mu } = SYMBOLS
const tex = String.raw

const LEVELS: readonly Formula[] = [
  {
    id: 'freeboard',
    title: 'Freeboard',
    tex: [tex`\text{available} = z_c - h - \min(H_s,\; 0.78\,h) - \frac{V^2}{2g}`],
    symbols: [symbol('z_c', 'Loaded crest', 'm'), h, Hs, V, g],
    assumptions: [
      'Utilisation is required over available. Nothing available fails, whatever is required; so does a tube that does not stand.',
      'The default of 0.10 m is common practice.',
    ],
    source: 'breaker limit 0.78 after McCowan (from memory); required freeboard common practice',
    tag: 'memory',
    worked: worked(
      {
        h: ['h', 0.5, 'm'],
        Hs: ['H_s', 0.05, 'm'],
        T: ['T', 2, 's'],
        V: ['V', 0.5, 'm/s'],
        D: ['D', 0.7, 'm'],
      },
      (x) => {
        const { freeboard, loadedShape } = evaluateSection(
          exampleSection({
            barrier: { diameter: x.D },
            water: { depth: x.h, waveHeight: x.Hs, wavePeriod: x.T, currentSpeed: x.V },
          }),
        )
        return [
          ['z_c', loadedShape.solved ? loadedShape.crest : 0, 'm'],
          [tex`\text{available}`, freeboard.available ?? 0, 'm'],
        ]
      },
    ),
  },
  {
    id: 'holds-to',
    title: 'Holds to',
    tex: [tex`\max\left\{h : \text{every check of the basis has utilisation} \le 1\right\}`],
    symbols: [h],
    assumptions: [
      'All checks at depths 0.005 D apart, up to D; edges between holding and failing refined to well below 0.1 mm.',
      'The holding interval that contains the depth of the case, else the lowest one. Shown rounded down to 1 mm. What governs at the failing end is named.',
      'A depth up to 1.5 D is a result, overtopped; above, it is an error.',
    ],
    source: 'search over the checks above',
    tag: 'derived',
    worked: worked({ D: ['D', 0.7, 'm'], h: ['h', 0.55, 'm'] }, (x) => {
      const section = exampleSection({ barrier: { diameter: x.D }, water: { depth: x.h } })
      return [[tex`\text{holds to}`, checkSection(section).holdsTo.depth, 'm']]
    }),
  },
  {
    id: 'leave',
    title: 'Leave level',
    tex: [
      tex`h_\text{leave} = h_\text{holds} - \max\left(\text{rise} \times t_\text{clear},\; 0.05\ \text{m}\right)`,
    ],
    symbols: [
      symbol(tex`h_\text{holds}`, 'Depth to which it holds', 'm'),
      symbol(tex`\text{rise}`, 'Rate of rise, entered or from the forecast', 'm/s'),
      symbol(tex`t_\text{clear}`, 'Time to clear the area, 20 min by default', 's'),
    ],
    assumptions: [
      'Everybody leaves before the water reaches it. Where nothing holds, or not at this water, there is no leave level: do not rely on it.',
    ],
    source: 'least margin and default: common practice, no source',
    tag: 'practice',
    worked: worked(
      {
        holds: [tex`h_\text{holds}`, 0.489, 'm'],
        rise: [tex`\text{rise}`, 0.1, 'm/h'],
        time: [tex`t_\text{clear}`, 1200, 's'],
      },
      (x) => {
        const leave = leaveLevel({
          holdsToDepth: x.holds,
          depth: 0.4,
          rateOfRise: x.rise / 3600,
          timeToClear: x.time,
        })
        return [[tex`h_\text{leave}`, leave.depth ?? 0, 'm']]
      },
    ),
  },
]

const BASES: readonly Formula[] = [
  {
    id: 'utilisation',
    title: 'Utilisation and verdict',
    tex: [
      tex`\text{utilisation} = \text{required} \times \frac{\text{demand}}{\text{resistance}}`,
      tex`\text{Holds} \le 0.90 < \text{Holds narrowly} \le 1 < \text{Does not hold}`,
    ],
    symbols: [
      symbol(tex`\text{required}`, 'Required factor of the check basis', '–'),
      symbol(tex`\text{demand},\ \text{resistance}`, 'In one unit', 'N/m or N'),
    ],
    assumptions: [
      'From demand and resistance, never from a negative factor. A resistance that is negative, or none at all against a demand, does not hold and is worst of all. Where nothing presses, it is 0.',
      'The answer is the worst check; what is not checked counts nowhere. Ties go to sliding, overturning, flotation, skirt, freeboard, fabric, ground, in this order.',
    ],
    source: 'definition',
    tag: 'derived',
    worked: worked(
      {
        required: [tex`\text{required}`, 1.5, '–'],
        demand: [tex`\text{demand}`, 1484, 'N/m'],
        resistance: [tex`\text{resistance}`, 2005, 'N/m'],
      },
      (x) => [[tex`\text{utilisation}`, compare(x, x.required).utilisation ?? 0, '–']],
    ),
  },
  {
    id: 'partial',
    title: 'With partial factors',
    tex: [
      tex`E = \gamma_G F_G + \gamma_Q F_Q, \qquad F_G = F_h - \tfrac{1}{2}\rho g h_d^2, \qquad F_Q = F_c + F_w + F_d`,
      tex`\text{sliding:}\quad E\cos\beta + (W_b - \gamma_G V)\sin\beta \;\le\; \frac{\mu}{\gamma_\mu}\left[\gamma_G\left(\rho g(L_w h - \tfrac{1}{2}L_w^2\sin\beta) - V\cos\beta - U\right) + W_b\cos\beta - E\sin\beta\right]`,
      tex`\text{C1: } \gamma_G = 1.35,\ \gamma_Q = 1.5,\ \gamma_\mu = 1 \qquad \text{C2: } 1.0,\ 1.3,\ 1.25`,
      tex`\text{EQU:}\quad 1.1\,M_G + 1.5\,M_Q \le 0.9\,(M_{Ww} + M_{Wb} - M_U)`,
      tex`\text{UPL:}\quad U + V \le 0.9\left(\rho g(L_w h - \tfrac{1}{2}L_w^2\sin\beta) + W_b\right)`,
      tex`\text{skirt:}\quad E_{C2} \le R(\mu/1.25), \qquad \text{fabric:}\quad 1.35\,\max(T, F) \le f / 3.0`,
    ],
    symbols: [
      symbol('E', 'Factored horizontal effect', 'N/m'),
      symbol('V', 'Lift of the tube by wet and dry water together', 'N/m'),
      symbol('M_G,\\ M_Q', 'Moments of still water, and of current, waves and debris', 'N'),
      F,
      Wb,
      U,
      mu,
    ],
    assumptions: [
      'Required 1 everywhere; the worse of both combinations counts for sliding. The water that presses and the water that holds carry the same factor: one source.',
      'It puts no margin on the level: the depth entered must already be the most unfavourable one (2.4.6.1(6)P).',
    ],
    source: 'after EN 1997-1:2004, Annex A; fabric factor common practice',
    tag: 'published',
    worked: worked({ h: ['h', 0.5, 'm'], D: ['D', 0.7, 'm'] }, (x) => {
      const section = exampleSection({ barrier: { diameter: x.D }, water: { depth: x.h } })
      const { sliding, flotation, skirt } = evaluateSection({ ...section, basis: 'partial-ec7' })
      return [
        [tex`R/E \text{ sliding}`, sliding.factor ?? 0, '–'],
        [tex`R/E \text{ flotation}`, flotation.factor ?? 0, '–'],
        [tex`R/E \text{ skirt}`, skirt.factor ?? 0, '–'],
      ]
    }),
  },
]

/** Freeboard, what it holds to, and when to leave. */
export const LEVELS_SECTION: MethodSection = {
  id: 'levels',
  title: 'Freeboard, holds-to and leave level',
  intro: ['A level is the depth plus the ground level, whenever the ground level is known.'],
  formulas: LEVELS,
}

/** Check bases and verdicts. */
export const BASES_SECTION: MethodSection = {
  id: 'bases',
  title: 'Check bases and verdicts',
  intro: ['Required factors of every basis, with its source, stand in the table below.'],
  formulas: BASES,
}
