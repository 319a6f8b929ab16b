import fc from 'fast-check'
import { expect, it } from 'vitest'
import { boxesMeet } from '../../../shared/drawing/label-placer'
import { shapePath } from '../../../shared/drawing/path-data'
import { SHAPE_ROLES, TEXT_ROLES, type Scene } from '../../../shared/drawing/scene'
import { arbitrarySection } from '../../support/arbitrary-section'
import {
  allWords,
  boxOf,
  draw,
  MEDIUM,
  NARROW,
  reachOf,
  shapesOf,
  textsOf,
  tube,
  WIDE,
} from './drawn-case'

const MOVING = { currentSpeed: 2, waveHeight: 0.2, wavePeriod: 2.5 }

const VIEWS = [WIDE, MEDIUM, NARROW, { width: 886, height: 440 }, { width: 520, height: 300 }]

/** What is wrong with a scene, in words; empty where nothing is. */
function faultsOf(scene: Scene): readonly string[] {
  return [...outside(scene), ...collisions(scene), ...unreadable(scene), ...unsound(scene)]
}

function outside(scene: Scene): readonly string[] {
  const { width, height } = scene
  const isOut = (x: number, y: number) =>
    !(x >= -0.5 && x <= width + 0.5 && y >= -0.5 && y <= height + 0.5)
  const shapes = shapesOf(scene).flatMap((shape) =>
    reachOf(shape)
      .filter(({ x, y }) => isOut(x, y))
      .slice(0, 1)
      .map(({ x, y }) => `${shape.id} leaves the view at ${x}, ${y}`),
  )
  const texts = textsOf(scene)
    .map((text) => ({ text, box: boxOf(text) }))
    .filter(({ box }) => isOut(box.left, box.top) || isOut(box.right, box.bottom))
    .map(({ text }) => `text ${text.id} leaves the view`)
  return [...shapes, ...texts]
}

function collisions(scene: Scene): readonly string[] {
  const texts = textsOf(scene).map((text) => ({ id: text.id, box: boxOf(text) }))
  return texts.flatMap((a, index) =>
    texts
      .slice(index + 1)
      .filter((b) => boxesMeet(a.box, b.box))
      .map((b) => `${a.id} and ${b.id} collide`),
  )
}

function unreadable(scene: Scene): readonly string[] {
  const words = allWords(scene)
  const missing = /drawing\.[\w.]+|\{\w+\}/.exec(words)
  return [
    ...(missing ? [`text ${missing[0]} is missing`] : []),
    ...(/NaN|Infinity/.test(words) ? ['a text is not a number'] : []),
  ]
}

function unsound(scene: Scene): readonly string[] {
  const paths = shapesOf(scene).map((shape) => ({ id: shape.id, d: shapePath(shape) }))
  const ids = scene.items.map(({ id }) => id)
  return [
    ...paths.filter(({ d }) => /NaN|Infinity|e/.test(d)).map(({ id }) => `${id} is no path`),
    ...(new Set(ids).size < ids.length ? ['two items have the same id'] : []),
    ...(scene.items.length < 120 ? [] : [`${scene.items.length} items`]),
  ]
}

const DRY = { water: { depth: 0 } }

const DEPTHS = [0, 0.02, 0.1, 0.3, 0.5, 0.6, 0.75, 0.85, 0.95, 0.98, 1, 1.2, 1.5]

it.each([
  ['the tube of 0.70 m', tube()],
  [
    'a small tube',
    tube({ barrier: { diameter: 0.2, skirtLength: 0.6, contactWidth: 0.03 }, ...DRY }),
  ],
  ['a large tube', tube({ barrier: { diameter: 3, skirtLength: 9, contactWidth: 0.5 } })],
  ['a long skirt', tube({ barrier: { skirtLength: 15 } })],
  [
    'a small tube with a long skirt',
    tube({ barrier: { diameter: 0.2, skirtLength: 15, contactWidth: 0.03 }, ...DRY }),
  ],
  ['a large tube with a short skirt', tube({ barrier: { diameter: 3, skirtLength: 0.4 } })],
  ['no skirt', tube({ barrier: { skirtLength: 0 } })],
  ['little air', tube({ barrier: { airPressure: 1500 } })],
  ['much air', tube({ barrier: { airPressure: 90_000 } })],
  ['ground that falls to the dry side', tube({ ground: { fall: 0.1 } })],
  ['ground that falls to the wet side', tube({ ground: { fall: -0.1 } })],
  ['a slope under a long skirt', tube({ barrier: { skirtLength: 15 }, ground: { fall: 0.1 } })],
  ['current, waves and debris', tube({ water: { depth: 0, ...MOVING }, debris: { force: 4000 } })],
  ['water on the dry side', tube({ water: { depth: 0, dryDepth: 0.2 } })],
])('keeps texts apart and everything inside the view: %s', (_name, section) => {
  const faults: string[] = []
  for (const share of DEPTHS) {
    const depth = share * section.barrier.diameter
    const wet = { ...section, water: { ...section.water, depth } }
    const marks = { holdsTo: 0.7 * depth, leave: 0.6 * depth, low: depth - 0.1, high: depth + 0.1 }
    for (const view of VIEWS) {
      for (const level of [null, { ground: 2.87, datum: 'QD' }]) {
        const found = faultsOf(draw(wet, { view, level, marks: { ...marks, expected: depth } }))
        faults.push(...found.map((fault) => `${share} D at ${view.width} px: ${fault}`))
      }
    }
  }
  expect(faults).toEqual([])
})

it('draws any case of the contract without a fault', () => {
  const scene = fc.record({
    section: arbitrarySection,
    view: fc.record({
      width: fc.integer({ min: 320, max: 1600 }),
      height: fc.integer({ min: 260, max: 700 }),
    }),
    holdsTo: fc.double({ min: 0, max: 1.5, noNaN: true }),
    isLevelled: fc.boolean(),
  })
  fc.assert(
    fc.property(scene, ({ section, view, holdsTo, isLevelled }) => {
      const depth = holdsTo * section.barrier.diameter
      const marks = { holdsTo: depth, leave: Math.max(0, depth - 0.05) }
      const level = isLevelled ? { ground: -1.234, datum: 'm local' } : null
      expect(faultsOf(draw(section, { view, marks, level }))).toEqual([])
    }),
    { numRuns: 300 },
  )
})

it('gives every item a role that has a look', () => {
  for (const { kind, role } of draw(tube()).items) {
    expect(kind === 'text' ? TEXT_ROLES : SHAPE_ROLES).toContain(role)
  }
})

it.each([2.2, 4, 6.5, 9, 12, 15])(
  'names both waters, holds-to and leave level on a phone, with a skirt of %s m',
  (skirtLength) => {
    for (const depth of [0.2, 0.3, 0.42, 0.5]) {
      const section = tube({ barrier: { skirtLength }, water: { depth } })
      const scene = draw(section, { view: NARROW, marks: { holdsTo: 0.588, leave: 0.538 } })
      const ids = textsOf(scene).map(({ id }) => id)
      const wanted = ['onSkirt-value', 'underSkirt-value', 'mark-holdsTo-value', 'mark-leave-value']
      expect(
        wanted.filter((id) => !ids.includes(id)),
        `${depth} m`,
      ).toEqual([])
    }
  },
)
