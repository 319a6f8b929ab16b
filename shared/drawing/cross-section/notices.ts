import type { Message } from '../../texts/format-text'
import { drawingText, quietLabel, valueLabel, type Composition } from './composition'
import { groundYAt, levelY, slopeRun } from './section-frame'

/** Names of the two sides, where every drawing has them. */
export function labelSides(drawing: Composition): void {
  const { frame, placer } = drawing
  const y = frame.layout.font + 9
  const weight = 600
  placer.put(
    { ...quietLabel(drawing, 'wet-side', drawingText('wetSide'), 'labelWater'), weight },
    { x: 12, y, anchor: 'start' },
  )
  placer.put(
    { ...quietLabel(drawing, 'dry-side', drawingText('drySide'), 'labelDry'), weight },
    { x: frame.width - 12, y, anchor: 'end' },
  )
}

/** Where no shape stands: what happens, and what the ghost is. */
export function labelFailure(drawing: Composition): void {
  const messages = failureMessages(drawing)
  const [first, second] = messages
  if (!first) return
  const { frame, input, body, placer } = drawing
  const level = levelY(frame, input.case.water.depth)
  const { font, small, gutterLeft, name } = frame.layout
  // On a phone the lines run over the tube as well.
  const surface = name === 'narrow' ? Math.min(level, body.top.y) : level
  const right = body.unloaded.centre.x - body.unloaded.radius
  const x =
    name === 'narrow' ? frame.width / 2 : Math.max(gutterLeft + 60, (gutterLeft + right) / 2)
  const block = font + small + 14
  const over = surface - block - 14
  const least = frame.layout.top + 6
  const y = over > least ? over : name === 'narrow' ? least : surface + font + 22
  const label = { ...valueLabel(drawing, 'failure', 'labelFails', first), size: font + 2 }
  placer.placeSurely(label, [{ x, y, anchor: 'middle' }])
  if (!second) return
  placer.placeSurely(quietLabel(drawing, 'failure-detail', second), [
    { x, y: y + small + 7, anchor: 'middle' },
  ])
}

/** The sentences of a section that does not stand; empty for one that does. */
export function failureMessages({ input }: Composition): readonly Message[] {
  const shape = input.evaluation.loadedShape
  if (shape.solved) return []
  const { depth } = input.case.water
  const last = input.lastStanding
  const detail = last
    ? [drawingText('lastStood', { depth: { value: last.depth, kind: 'length', rounding: 'down' } })]
    : []
  switch (shape.reason) {
    case 'no-skirt':
      return [drawingText('noSkirt')]
    case 'gives-way':
      return [drawingText('givesWay', { depth: { value: depth, kind: 'length' } }), ...detail]
    case 'overtopped': {
      const over = depth - (last?.crest ?? input.case.barrier.diameter)
      const height = { value: over, kind: 'length' } as const
      return [
        over > 0 ? drawingText('overtoppedBy', { height }) : drawingText('overtopped'),
        ...detail,
      ]
    }
  }
}

/** Water on the dry side, and the slope of the ground. */
export function labelSurroundings(drawing: Composition): void {
  labelDryWater(drawing)
  labelFall(drawing)
  labelEdge(drawing)
}

/** How open the wet edge of the skirt is taken to be. */
function labelEdge(drawing: Composition): void {
  const { body, input, placer, frame } = drawing
  const edge = body.skirt[0]
  if (!edge || frame.layout.name === 'narrow') return
  const { model, edgeFactor } = input.case.uplift
  const open = model === 'none' ? 0 : edgeFactor
  const message =
    open === 0
      ? drawingText('edgeSealed')
      : open === 1
        ? drawingText('edgeOpen')
        : drawingText('edgePartly', { share: { value: open, kind: 'percent' } })
  placer.place(quietLabel(drawing, 'edge', message), [
    { x: edge.x - 8, y: edge.y + 24, anchor: 'end' },
    { x: edge.x - 8, y: edge.y + 40, anchor: 'end' },
  ])
}

function labelDryWater(drawing: Composition): void {
  const { input, frame, placer, body } = drawing
  const { dryDepth } = input.case.water
  if (dryDepth <= 0) return
  const y = levelY(frame, dryDepth) - 7
  const message = drawingText('depth', { depth: { value: dryDepth, kind: 'length' } })
  placer.place(valueLabel(drawing, 'dry-water-value', 'labelWater', message), [
    { x: frame.width - 32, y, anchor: 'end' },
    { x: body.right + 10, y, anchor: 'start' },
    { x: frame.width - 32, y: y - 18, anchor: 'end' },
  ])
}

function labelFall(drawing: Composition): void {
  const { frame, placer } = drawing
  const run = slopeRun(frame.fall)
  if (run === null) return
  const name = frame.fall > 0 ? 'fallsToDry' : 'fallsToWet'
  const ground = groundYAt(frame, frame.width - 80)
  placer.place(quietLabel(drawing, 'fall', drawingText(name, { run }), 'labelGround'), [
    { x: frame.width - 10, y: ground + 26, anchor: 'end' },
    { x: 24, y: groundYAt(frame, 24) + 28, anchor: 'start' },
    { x: frame.width - 10, y: frame.height - 50, anchor: 'end' },
    { x: 12, y: frame.height - 12, anchor: 'start' },
  ])
}
