import type { Point, Scene } from './scene'
import { drawBarrier, labelBarrier } from './cross-section/barrier'
import { drawingText, startComposition, type Composition } from './cross-section/composition'
import { drawCut } from './cross-section/cut-mark'
import { describeSection } from './cross-section/description'
import { drawDimensions, labelDimensions } from './cross-section/dimensions'
import { drawExtras, labelExtras } from './cross-section/extras'
import { drawGround } from './cross-section/ground'
import { drawLegend } from './cross-section/legend'
import { drawMarks, drawStaff } from './cross-section/marks'
import { labelFailure, labelSides, labelSurroundings } from './cross-section/notices'
import { drawPressure, drawUplift, labelPressure } from './cross-section/pressure'
import { levelY, GREATEST_DEPTH } from './cross-section/section-frame'
import type { CrossSectionInput } from './cross-section/section-input'
import { drawForces, labelForces } from './cross-section/thrust'
import { drawSurfaces, drawWater, waterGripX } from './cross-section/water'

export type {
  CrossSectionInput,
  DrawnEvaluation,
  GroundLevel,
  LastStanding,
  SectionMarks,
} from './cross-section/section-input'

/** Where the drawing can be taken hold of, and what a pixel means there. */
export interface SectionGrips {
  /** On the water surface. */
  readonly water: Point
  /** In the tube. */
  readonly air: Point
  /** Radius of the visible grip [px]. */
  readonly radius: number
  /** px per metre of depth, upwards. */
  readonly scale: number
  /** Height of the ground from which the depth counts [px]. */
  readonly groundY: number
  /** Greatest depth of the case [m]. */
  readonly greatestDepth: number
}

/** A cross-section that can be taken hold of. */
export interface CrossSectionScene extends Scene {
  readonly grips: SectionGrips
}

/**
 * The cross-section to scale: water left, dry side right, one scale for lengths, one for pressures
 * and one for forces, each stated in the drawing. Composed for a size in CSS pixels, so that texts
 * stay readable; nothing but the water moves while only the depth changes.
 */
export function crossSectionScene(input: CrossSectionInput): CrossSectionScene {
  const drawing = startComposition(input)
  const grips = gripsOf(drawing)
  drawShapes(drawing)
  reserveGrips(drawing, grips)
  drawTexts(drawing)
  return {
    width: input.view.width,
    height: input.view.height,
    title: drawingText('sectionTitle'),
    description: describeSection(drawing),
    items: [...drawing.shapes, ...drawing.placer.placed],
    grips,
  }
}

function drawShapes(drawing: Composition): void {
  drawWater(drawing)
  drawGround(drawing)
  drawUplift(drawing)
  drawBarrier(drawing)
  drawPressure(drawing)
  drawSurfaces(drawing)
  drawExtras(drawing)
  drawForces(drawing)
  drawStaff(drawing)
  drawCut(drawing)
}

/** Texts by importance: an early one gets the better place. Some bring their own lines. */
function drawTexts(drawing: Composition): void {
  labelSides(drawing)
  drawLegend(drawing)
  drawDimensions(drawing)
  labelFailure(drawing)
  drawMarks(drawing)
  labelDimensions(drawing)
  labelForces(drawing)
  labelPressure(drawing)
  labelBarrier(drawing)
  labelSurroundings(drawing)
  labelExtras(drawing)
}

function gripsOf(drawing: Composition): SectionGrips {
  const { frame, body, input } = drawing
  return {
    water: { x: waterGripX(drawing), y: levelY(frame, input.case.water.depth) },
    air: body.centre,
    radius: frame.layout.grip,
    scale: frame.scale,
    groundY: frame.groundY,
    greatestDepth: GREATEST_DEPTH * input.case.barrier.diameter,
  }
}

function reserveGrips({ placer }: Composition, { water, air, radius }: SectionGrips): void {
  for (const { x, y } of [water, air]) {
    const reach = radius + 3
    placer.reserve({ left: x - reach, right: x + reach, top: y - reach, bottom: y + reach })
  }
}
