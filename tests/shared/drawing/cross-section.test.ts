import { describe, expect, it } from 'vitest'
import { frictionResistance } from '../../../shared/drawing/cross-section/friction'
import { upliftShare } from '../../../shared/calc/uplift/uplift-share'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import type { Scene } from '../../../shared/drawing/scene'
import { toDisplay, type Quantity } from '../../../shared/units'
import {
  allWords,
  draw,
  drawn,
  has,
  item,
  lengths,
  MEDIUM,
  NARROW,
  pointsOf,
  reachOf,
  textsOf,
  tube,
  WIDE,
  words,
} from './drawn-case'

/** The scale that the drawing states in its legend, in px per SI unit. */
function statedScale(scene: Scene, id: 'force' | 'pressure'): number {
  const [length] = lengths(item(scene, 'arrows', `scale-${id}`))
  const { value } = item(scene, 'text', `scale-${id}-value`).message.values!.value as Quantity
  return length! / value
}

const highest = (d: string) => Math.min(...pointsOf(d).map(({ y }) => y))

describe('the drawing is to scale', () => {
  it.each(['metric', 'us'] as const)('states its scales in round %s figures', (units) => {
    const scene = draw(tube(), { units })
    for (const id of ['force', 'pressure', 'length']) {
      const { value, kind } = item(scene, 'text', `scale-${id}-value`).message.values!
        .value as Quantity
      expect(toDisplay(value, kind, units).toExponential(6)).toMatch(/^[125]\.000000e/)
    }
  })

  it('shows the loaded crest at its height above the ground', () => {
    const section = tube()
    const scene = draw(section)
    const shape = evaluateSection(section).loadedShape
    if (!shape.solved) throw new Error('the tube stands')
    const rise = scene.grips.groundY - highest(item(scene, 'path', 'tube').d)
    expect(rise).toBeCloseTo(shape.crest * scene.grips.scale, 1)
  })

  it.each([0.1, 0.42, 0.6, 0.9])('shows the surface of %s m of water at its depth', (depth) => {
    const scene = draw(tube({ water: { depth } }))
    const [start] = pointsOf(item(scene, 'path', 'water-line').d)
    expect(scene.grips.groundY - start!.y).toBeCloseTo(depth * scene.grips.scale, 1)
    expect(scene.grips.water.y).toBeCloseTo(start!.y, 1)
  })

  it('uses one scale in both directions: the unloaded tube is a circle of its diameter', () => {
    const scene = draw(tube())
    const skirt = pointsOf(item(scene, 'path', 'skirt-dimension').d)
    const run = Math.max(...skirt.map(({ x }) => x)) - Math.min(...skirt.map(({ x }) => x))
    expect(item(scene, 'circle', 'unloaded').r).toBeCloseTo(0.35 * scene.grips.scale, 9)
    // The oblique strokes stand out by 3.5 px at each end.
    expect(run - 7).toBeCloseTo(2.2 * scene.grips.scale, 1)
  })

  it('draws the ground in its true slope', () => {
    const scene = draw(tube({ ground: { fall: 0.05 } }))
    const ground = pointsOf(item(scene, 'path', 'ground-line').d)
    const [left, right] = [ground[0]!, ground.at(-1)!]
    expect((right.y - left.y) / (right.x - left.x)).toBeCloseTo(0.05, 4)
  })

  it('lays the wet edge as deep under water as the formula says', () => {
    const section = tube({ ground: { fall: -0.08 } })
    const scene = draw(section)
    const edge = pointsOf(item(scene, 'path', 'skirt').d)[0]!
    const sin = -0.08 / Math.hypot(1, 0.08)
    const edgeDepth = 0.42 - 2.2 * sin
    // The line of the skirt is raised by half its width.
    expect(edge.y + 2 - scene.grips.water.y).toBeCloseTo(edgeDepth * scene.grips.scale, 1)
  })

  it('keeps scale and ground where they are while only the depth changes', () => {
    const frames = [0, 0.05, 0.42, 0.66, 0.69, 0.8, 1.5 * 0.7].map((depth) => {
      const { scale, groundY, water } = draw(tube({ water: { depth } })).grips
      return { scale, groundY, x: water.x }
    })
    for (const frame of frames) expect(frame).toEqual(frames[0])
  })
})

describe('arrows', () => {
  it.each([
    ['still water', tube()],
    ['deep water', tube({ water: { depth: 0.6 } })],
    ['waves, current and debris', tube({ ...windy() })],
  ])('draw thrust and friction in the stated force scale: %s', (_name, section) => {
    const scene = draw(section)
    const { thrust } = evaluateSection(section)
    const scale = statedScale(scene, 'force')
    const [thrustLength] = lengths(item(scene, 'arrows', 'thrust'))
    const [frictionLength] = lengths(item(scene, 'arrows', 'friction'))
    expect(thrustLength! / scale).toBeCloseTo(thrust.total, 6)
    expect(frictionLength! / scale).toBeCloseTo(frictionResistance(drawn(section)), 6)
  })

  it('draw the thrust at its arm', () => {
    const section = tube()
    const scene = draw(section)
    const [arrow] = item(scene, 'arrows', 'thrust').arrows
    const height = (scene.grips.groundY - arrow!.to.y) / scene.grips.scale
    expect(height).toBeCloseTo(evaluateSection(section).thrust.arm!, 9)
    expect(arrow!.to.x).toBeGreaterThan(arrow!.from.x)
  })

  it('draw water on the skirt at its pressure, in the stated pressure scale', () => {
    const scene = draw(tube())
    const scale = statedScale(scene, 'pressure')
    const down = lengths(item(scene, 'arrows', 'on-skirt'))
    expect(down.length).toBeGreaterThan(5)
    for (const length of down) expect(length / scale).toBeCloseTo(1000 * 9.81 * 0.42, 3)
  })

  it('draw the pressure on the face in proportion to the depth below the surface', () => {
    const scene = draw(tube())
    const scale = statedScale(scene, 'pressure')
    const { arrows } = item(scene, 'arrows', 'on-face')
    for (const { from, to } of arrows) {
      const below = (to.y - scene.grips.water.y) / scene.grips.scale
      expect((to.x - from.x) / scale).toBeCloseTo(9810 * below, 3)
    }
  })

  it.each(['linear', 'deep', 'developing'] as const)(
    'draw water under the skirt as the true diagram of the model: %s',
    (model) => {
      const uplift = { model, edgeFactor: 0.8, diffusivity: 1e-5, time: 40_000 }
      const section = tube({ uplift })
      const scene = draw(section)
      const scale = statedScale(scene, 'pressure')
      const { arrows } = item(scene, 'arrows', 'under-skirt')
      const edge = item(scene, 'path', 'uplift-area')
      const left = Math.min(...reachOf(edge).map(({ x }) => x))
      expect(arrows.length).toBeGreaterThan(4)
      for (const { from, to } of arrows) {
        const fromEdge = Math.max(0, (to.x - left) / scene.grips.scale)
        const head = 0.8 * 0.42 * upliftShare(section.uplift, 2.32, fromEdge)
        expect((from.y - to.y) / scale / 9810).toBeCloseTo(head, 4)
      }
    },
  )

  it('draw no water under a sealed skirt', () => {
    const scene = draw(tube({ uplift: { model: 'none' } }))
    expect(has(scene, 'under-skirt')).toBe(false)
    expect(words(scene, 'edge')).toBe('sealed edge')
  })

  it('puts the mark of what is needed where the utilisation says', () => {
    const section = tube({ water: { depth: 0.6 } })
    const scene = draw(section)
    const { utilisation } = evaluateSection(section).sliding
    const [arrow] = item(scene, 'arrows', 'friction').arrows
    const mark = pointsOf(item(scene, 'path', 'friction-needed').d)[0]!
    const length = arrow!.from.x - arrow!.to.x
    expect((mark.x - arrow!.to.x) / length).toBeCloseTo(utilisation!, 2)
    expect(has(scene, 'friction-shortfall')).toBe(utilisation! > 1)
  })
})

it('takes the friction that the sliding check takes, on any slope', () => {
  for (const fall of [-0.1, -0.03, 0, 0.06, 0.1]) {
    const section = tube({ ground: { fall }, water: { dryDepth: 0.08, currentSpeed: 1 } })
    const { workings } = evaluateSection(section)
    expect(frictionResistance(drawn(section))).toBeCloseTo(workings.sliding.resistance, 6)
  }
})

describe('what is present is drawn, and nothing else', () => {
  it('leaves current, waves, debris and dry water out of a still case', () => {
    const scene = draw(tube())
    for (const id of ['current', 'wave', 'debris', 'debris-force', 'dry-water', 'fall']) {
      expect(has(scene, id), id).toBe(false)
    }
  })

  it('draws current, waves, debris and dry water where they are', () => {
    const scene = draw(tube(windy()))
    for (const id of ['current', 'wave', 'debris', 'debris-force', 'dry-water', 'dry-thrust']) {
      expect(has(scene, id), id).toBe(true)
    }
    expect(words(scene, 'current-value')).toContain('1.20')
  })

  it('marks what the caller knows: forecast, holds-to and leave level', () => {
    const marks = { low: 0.3, expected: 0.42, high: 0.54, holdsTo: 0.4896, leave: 0.4396 }
    const scene = draw(tube(), { marks, level: { ground: 2.87, datum: 'QD' } })
    expect(words(scene, 'mark-holdsTo-value')).toBe('holds to 3.359\u00a0m')
    expect(words(scene, 'mark-leave-value')).toBe('leave at 3.309\u00a0m')
    expect(words(scene, 'mark-high-value')).toBe('high 3.410\u00a0m')
    expect(words(scene, 'level-value')).toBe('3.290\u00a0m QD (0.420\u00a0m)')
    const line = pointsOf(item(scene, 'path', 'mark-holdsTo').d)[0]!
    expect(scene.grips.groundY - line.y).toBeCloseTo(0.4896 * scene.grips.scale, 1)
  })

  it('gives freeboard and crest as the check has them', () => {
    const scene = draw(tube())
    expect(words(scene, 'freeboard-value')).toBe('276\u00a0mm')
    expect(words(scene, 'crest-value')).toBe('0.697\u00a0m')
    const ends = pointsOf(item(scene, 'path', 'freeboard').d)
    expect(ends[0]!.y - ends[1]!.y).toBeCloseTo(0.27668 * scene.grips.scale, 1)
  })

  it('cuts a long skirt with a mark instead of shrinking the tube', () => {
    const scene = draw(tube({ barrier: { skirtLength: 15 } }))
    expect(has(scene, 'cut-line')).toBe(true)
    expect(words(scene, 'skirt-length')).toBe('skirt 15.000\u00a0m')
    expect(item(scene, 'circle', 'unloaded').r).toBeGreaterThan(60)
    expect(has(draw(tube()), 'cut-line')).toBe(false)
  })
})

describe('a tube that does not stand', () => {
  it('is overtopped, by how much, with the last shape as a ghost', () => {
    const scene = draw(tube({ water: { depth: 0.8 } }))
    expect(words(scene, 'failure')).toMatch(/^Overtopped by 0\.12\d\u00a0m$/)
    expect(words(scene, 'failure-detail')).toContain('the last shape that stood')
    expect(item(scene, 'path', 'tube').role).toBe('ghost')
    expect(has(scene, 'crest')).toBe(false)
  })

  it('gives way on a skirt that is too short', () => {
    const scene = draw(tube({ barrier: { skirtLength: 0.1 }, water: { depth: 0.3 } }))
    expect(words(scene, 'failure')).toBe('Gives way at 0.300\u00a0m')
    expect(item(scene, 'path', 'tube').role).toBe('ghost')
  })

  it.each([WIDE, MEDIUM, NARROW])('never prints "Holds" without a skirt (%o)', (view) => {
    const scene = draw(tube({ barrier: { skirtLength: 0 } }), { view })
    expect(words(scene, 'failure')).toBe('No skirt: nothing keeps the tube in place')
    expect(allWords(scene)).not.toMatch(/Holds|holds to|section holds/)
    expect(has(scene, 'skirt')).toBe(false)
  })
})

describe('the text for those who do not see the drawing', () => {
  it('changes with the case', () => {
    const deep = allWords(draw(tube({ water: { depth: 0.6 } })))
    expect(deep).toContain('The water is 0.600\u00a0m deep.')
    expect(deep).toContain('The section does not hold.')
    expect(allWords(draw(tube()))).toContain('The section holds.')
  })

  it('speaks in levels where the ground is known', () => {
    const scene = draw(tube(), { level: { ground: 2.87, datum: 'QD' } })
    expect(allWords(scene)).toContain('The water stands at 3.290\u00a0m QD, 0.420\u00a0m deep.')
  })
})

it('shows less on a phone, in type that is larger beside the drawing', () => {
  const wide = draw(tube())
  const narrow = draw(tube(), { view: NARROW })
  expect(textsOf(narrow).length).toBeLessThan(textsOf(wide).length)
  for (const { size } of textsOf(narrow)) expect(size).toBeGreaterThanOrEqual(11.5)
})

function windy() {
  return {
    water: {
      depth: 0.42,
      dryDepth: 0.1,
      currentSpeed: 1.2,
      waveHeight: 0.1,
      wavePeriod: 2,
    },
    debris: { force: 3000 },
  }
}
