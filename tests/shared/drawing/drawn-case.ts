import { evaluateSection } from '../../../shared/checks/evaluate-section'
import {
  crossSectionScene,
  type CrossSectionInput,
  type CrossSectionScene,
} from '../../../shared/drawing/cross-section'
import { textBox, type Box } from '../../../shared/drawing/label-placer'
import { shapePath } from '../../../shared/drawing/path-data'
import type {
  ArrowsItem,
  Point,
  Scene,
  SceneItem,
  ShapeItem,
  TextItem,
} from '../../../shared/drawing/scene'
import { lastStanding, standingOutline } from '../../../shared/drawing/standing-outline'
import { textWidth } from '../../../shared/drawing/text-width'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import type { SectionCase, SectionCaseInput } from '../../../shared/schemas/section-case'
import { texts } from '../../../shared/texts'
import { textResolver } from '../../../shared/texts/format-text'

export const WIDE = { width: 1100, height: 460 }
export const MEDIUM = { width: 700, height: 420 }
export const NARROW = { width: 358, height: 300 }

export const say = textResolver(texts.en, 'metric')

type Change = {
  readonly [Part in keyof SectionCaseInput]?: Partial<SectionCaseInput[Part]>
}

/** Tube 0.70 m on turf with 0.42 m of water, and what a test changes about it. */
export function tube(change: Change = {}): SectionCase {
  return parseSectionCase({
    barrier: {
      diameter: 0.7,
      skirtLength: 2.2,
      contactWidth: 0.12,
      mass: 4.8,
      airPressure: 15_000,
      fabricStrength: 60_000,
      ...change.barrier,
    },
    ground: { friction: 0.45, ...change.ground },
    water: { depth: 0.42, ...change.water },
    uplift: { ...change.uplift },
    debris: { ...change.debris },
  })
}

/** The input of a drawing, computed by the engine. */
export function drawn(
  section: SectionCase,
  more: Partial<CrossSectionInput> = {},
): CrossSectionInput {
  const outline = standingOutline(section)
  return {
    case: section,
    evaluation: evaluateSection(section),
    outline,
    lastStanding: outline ? null : lastStanding(section),
    view: WIDE,
    ...more,
  }
}

export function draw(
  section: SectionCase,
  more: Partial<CrossSectionInput> = {},
): CrossSectionScene {
  return crossSectionScene(drawn(section, more))
}

export function item<Kind extends SceneItem['kind']>(
  scene: Scene,
  kind: Kind,
  id: string,
): Extract<SceneItem, { kind: Kind }> {
  const found = scene.items.find((candidate) => candidate.kind === kind && candidate.id === id)
  if (!found) throw new Error(`The scene has no ${kind} "${id}"`)
  return found as Extract<SceneItem, { kind: Kind }>
}

export function has(scene: Scene, id: string): boolean {
  return scene.items.some((candidate) => candidate.id === id)
}

export function textsOf(scene: Scene): readonly TextItem[] {
  return scene.items.filter((candidate) => candidate.kind === 'text')
}

export function shapesOf(scene: Scene): readonly ShapeItem[] {
  return scene.items.filter((candidate) => candidate.kind !== 'text')
}

export function words(scene: Scene, id: string): string {
  return say(item(scene, 'text', id).message)
}

/** Every word that the scene prints or says. */
export function allWords(scene: Scene): string {
  const printed = textsOf(scene).map(({ message }) => say(message))
  return [say(scene.title), ...scene.description.map(say), ...printed].join('\n')
}

/** Corner points of path data made of straight lines. */
export function pointsOf(d: string): readonly Point[] {
  return [...d.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map(([, x, y]) => ({
    x: Number(x),
    y: Number(y),
  }))
}

/** Points that a shape reaches. */
export function reachOf(shape: ShapeItem): readonly Point[] {
  if (shape.kind === 'circle') {
    const { cx, cy, r } = shape
    return [
      { x: cx - r, y: cy - r },
      { x: cx + r, y: cy + r },
    ]
  }
  return pointsOf(shapePath(shape))
}

export function lengths({ arrows }: ArrowsItem): readonly number[] {
  return arrows.map(({ from, to }) => Math.hypot(to.x - from.x, to.y - from.y))
}

export function boxOf(text: TextItem): Box {
  return textBox(text, textWidth(say(text.message), text.size, text.weight), text.size)
}
