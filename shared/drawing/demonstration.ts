import { bodyShape } from './cross-section/body-shape'
import { drawBarrier } from './cross-section/barrier'
import type { Composition } from './cross-section/composition'
import { drawGround } from './cross-section/ground'
import { drawFace, drawOnSkirt, drawUplift } from './cross-section/pressure'
import { drawSurfaces, drawWater } from './cross-section/water'
import { levelY } from './cross-section/section-frame'
import { LabelPlacer } from './label-placer'
import type { Scene } from './scene'
import { demoText } from './demonstration/demo-text'
import { demonstrationFrame, stripRows } from './demonstration/demonstration-frame'
import type { DemonstrationInput } from './demonstration/demonstration-input'
import { drawHeights, labelSides } from './demonstration/heights'
import { drawGuessOnRows, drawRows } from './demonstration/rows'
import { drawPush, drawThings, drawWind } from './demonstration/things'
import {
  collapsedHeight,
  drawCollapsedTube,
  drawLooseTube,
  drawThroughWater,
} from './demonstration/tube-shapes'

export type {
  DemonstrationInput,
  PictureBar,
  PictureGuess,
  PictureLevel,
  PicturePart,
} from './demonstration/demonstration-input'

/** A section as a scene, with where its water is taken hold of. */
export interface DemonstrationScene extends Scene {
  /** px per metre and the height of the ground [px]. */
  readonly scale: number
  readonly groundY: number
}

/**
 * The section for a room full of people: the shapes of the workbench's drawing with few words and
 * large type, and what the scene is about as bars under the ground. Lengths and forces to scale.
 *
 * @param hasGuessRow Keeps room under the bars for the guess, so that nothing jumps when it comes.
 */
export function demonstrationScene(
  input: DemonstrationInput,
  hasGuessRow: boolean,
): DemonstrationScene {
  const drawing = compose(input, hasGuessRow)
  drawBody(drawing, input)
  drawRows(drawing, input)
  drawGuessOnRows(drawing, input)
  labelSides(drawing)
  drawHeights(drawing, input)
  drawThings(drawing, input)
  const { frame, shapes, placer } = drawing
  return {
    width: input.view.width,
    height: input.view.height,
    title: demoText('title'),
    description: [describe(input)],
    items: [...shapes, ...placer.placed],
    scale: frame.scale,
    groundY: frame.groundY,
  }
}

function compose(input: DemonstrationInput, hasGuessRow: boolean): Composition {
  const rows = stripRows({ bars: input.bars.length, hasGuessRow })
  const frame = demonstrationFrame(input, rows)
  const of = {
    case: input.case,
    evaluation: input.evaluation,
    outline: input.outline,
    view: input.view,
  }
  return {
    input: of,
    frame,
    body: bodyShape(of, frame),
    shapes: [],
    placer: new LabelPlacer(input.view, input.measure),
  }
}

function drawBody(drawing: Composition, input: DemonstrationInput): void {
  const { adrift, collapse, parts } = input
  if (adrift) drawLoose(drawing, input)
  else if (collapse !== null) drawSoft(drawing, collapse)
  else drawStanding(drawing, input)
  if (parts.includes('push')) drawPush(drawing)
  drawWind(drawing, input.wind)
}

function drawStanding(drawing: Composition, { parts, case: section }: DemonstrationInput): void {
  drawWater(drawing)
  drawGround(drawing)
  if (parts.includes('uplift')) drawUplift(drawing)
  drawBarrier(drawing)
  const isWet = section.water.depth > 0
  if (isWet && parts.includes('face') && drawing.body.state === 'standing') drawFace(drawing)
  if (isWet && parts.includes('onSkirt')) drawOnSkirt(drawing)
  drawSurfaces(drawing)
}

function drawLoose(drawing: Composition, { adrift }: DemonstrationInput): void {
  const { frame, body } = drawing
  const loose = adrift ?? { lift: 0, drift: 0, turn: 0 }
  const isAway = loose.lift > 0 || loose.drift > 0
  const openness = Math.min(1, loose.drift / (2 * drawing.input.case.barrier.diameter))
  if (isAway)
    drawThroughWater(drawing, body.unloaded.centre.x + frame.scale * loose.drift, openness)
  else drawWater(drawing)
  drawGround(drawing)
  drawLooseTube(drawing, loose)
  if (!isAway) drawSurfaces(drawing)
}

function drawSoft(drawing: Composition, collapse: number): void {
  const { body, input, frame } = drawing
  const { depth } = input.case.water
  const height = collapsedHeight(input.case.barrier.diameter, collapse)
  const openness = depth > 0 ? Math.min(1, Math.max(0, (depth - height) / depth)) : 0
  const isOver = levelY(frame, depth) < levelY(frame, height)
  if (isOver) drawThroughWater(drawing, body.unloaded.centre.x, openness)
  else drawWater(drawing)
  drawGround(drawing)
  drawCollapsedTube(drawing, collapse)
  if (!isOver) drawSurfaces(drawing)
}

function describe({ case: section, evaluation }: DemonstrationInput): Scene['title'] {
  const { depth, dryDepth } = section.water
  return demoText('describe', {
    depth: { value: depth, kind: 'length' },
    dry: { value: dryDepth, kind: 'length' },
    push: { value: evaluation.thrust.total, kind: 'forcePerLength' },
  })
}
