import { niceShownBelow } from '../nice-ticks'
import { areaPath } from '../path-data'
import type { Point } from '../scene'
import type { Quantity } from '../../units'
import { addArrows, addPath, drawingText, quietLabel, type Composition } from './composition'

/** Distance of the legend's middle from the lower edge, and between its parts [px]. */
const FOOT = 13
const GAP = 20
const TEXT_GAP = 6

/** Lengths at which a sample is easy to compare [px]. */
const PRESSURE_SAMPLE = 40
const FORCE_SAMPLE = 64
const LENGTH_SAMPLE = 90

interface Sample {
  readonly id: string
  readonly length: number
  readonly quantity: Quantity
  readonly draw: (from: Point, to: Point) => void
}

/** One line under the drawing that states its three scales: lengths, pressures, forces. */
export function drawLegend(drawing: Composition): void {
  const { frame, placer } = drawing
  const y = frame.height - FOOT
  let x = frame.width - 10
  for (const sample of samples(drawing)) {
    const label = quietLabel(
      drawing,
      `scale-${sample.id}-value`,
      drawingText('scaleValue', { value: sample.quantity }),
    )
    const textX = x - placer.width(label)
    const from = { x: textX - TEXT_GAP - sample.length, y }
    if (from.x < 8) return
    sample.draw(from, { x: from.x + sample.length, y })
    placer.put(label, { x: textX, y: y + 4, anchor: 'start' })
    placer.reserve({ left: from.x, right: textX, top: y - 8, bottom: y + 8 })
    x = from.x - GAP
  }
}

function samples(drawing: Composition): readonly Sample[] {
  const { frame, input } = drawing
  const weight = input.case.water.density * input.case.gravity
  const { units = 'metric' } = input
  const pressure = niceShownBelow((PRESSURE_SAMPLE / frame.headScale) * weight, 'pressure', units)
  const force = niceShownBelow(FORCE_SAMPLE / frame.forceScale, 'forcePerLength', units)
  const length = niceShownBelow(LENGTH_SAMPLE / frame.scale, 'length', units)
  return [
    {
      id: 'force',
      length: force * frame.forceScale,
      quantity: { value: force, kind: 'forcePerLength' },
      draw: (from, to) => addArrows(drawing, 'scale-force', 'force', [{ from, to }]),
    },
    {
      id: 'pressure',
      length: (pressure / weight) * frame.headScale,
      quantity: { value: pressure, kind: 'pressure' },
      draw: (from, to) => addArrows(drawing, 'scale-pressure', 'pressure', [{ from, to }]),
    },
    {
      id: 'length',
      length: length * frame.scale,
      quantity: { value: length, kind: 'length' },
      draw: (from, to) => drawBar(drawing, from, to),
    },
  ]
}

function drawBar(drawing: Composition, from: Point, to: Point): void {
  const middle = (from.x + to.x) / 2
  const block = (left: number, right: number) =>
    areaPath([
      { x: left, y: from.y - 2.5 },
      { x: right, y: from.y - 2.5 },
      { x: right, y: from.y + 2.5 },
      { x: left, y: from.y + 2.5 },
    ])
  addPath(drawing, 'scale-bar-frame', 'staffFrame', block(from.x, to.x))
  addPath(drawing, 'scale-bar', 'staff', block(from.x, middle))
}
