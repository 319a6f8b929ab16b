import { boxAround, type Spot } from '../label-placer'
import { segmentsPath } from '../path-data'
import type { Arrow } from '../scene'
import {
  addArrows,
  addPath,
  drawingText,
  quietLabel,
  valueLabel,
  type Composition,
} from './composition'
import { movedInside, thrustArrow } from './forces'
import { frictionResistance } from './friction'
import { crossing } from './body-shape'
import { groundYAt, levelY, toScene } from './section-frame'
import { reversed } from '../path-data'

/** The thrust at its arm, the thrust of the dry side's water, and the friction that answers. */
export function drawForces(drawing: Composition): void {
  const thrust = thrustArrow(drawing)
  if (thrust) {
    addArrows(drawing, 'thrust', 'force', [thrust])
    drawing.placer.avoid(boxAround(thrust.from, thrust.to, 7))
  }
  drawDryThrust(drawing)
  drawFriction(drawing)
}

function drawDryThrust(drawing: Composition): void {
  const { input, frame, body } = drawing
  const { dry } = input.evaluation.thrust
  if (dry <= 0) return
  const y = levelY(frame, input.case.water.dryDepth / 3)
  const x = (crossing(reversed(body.dryFace), y)?.x ?? body.right) + 4
  addArrows(drawing, 'dry-thrust', 'force', [
    movedInside(frame, { from: { x: x + frame.forceScale * dry, y }, to: { x, y } }),
  ])
}

/** Room for the arrow of friction under the dry side [px]. */
const FRICTION_DROP = 24
const TOE_GAP = 16

/** The arrow of friction, and how far it would have to reach; null where nothing is to be held. */
export function frictionArrow(
  drawing: Composition,
): { arrow: Arrow; needed: number | null } | null {
  const { input, frame } = drawing
  if (input.case.barrier.skirtLength === 0 || input.case.water.depth <= 0) return null
  const resistance = frictionResistance(input)
  if (resistance <= 0) return null
  const { utilisation } = input.evaluation.sliding
  const needed = utilisation === null ? null : utilisation * resistance
  const longest = frame.forceScale * Math.max(resistance, needed ?? 0)
  const toe = toScene(frame, { x: input.case.barrier.contactWidth, y: 0 }).x + TOE_GAP
  const head = Math.max(10, Math.min(toe, frame.width - 12 - longest))
  const y = groundYAt(frame, Math.max(0, head)) + FRICTION_DROP
  const tail = head + frame.forceScale * resistance
  return {
    arrow: { from: { x: tail, y }, to: { x: head, y } },
    needed: needed === null ? null : head + frame.forceScale * needed,
  }
}

function drawFriction(drawing: Composition): void {
  const friction = frictionArrow(drawing)
  if (!friction) return
  const { arrow, needed } = friction
  addArrows(drawing, 'friction', 'friction', [arrow])
  drawing.placer.avoid(boxAround(arrow.from, arrow.to, 8))
  if (needed === null || needed <= arrow.to.x + 1) return
  const { y } = arrow.to
  if (needed > arrow.from.x + 2) {
    const shortfall = segmentsPath([[arrow.from, { x: needed, y }]])
    addPath(drawing, 'friction-shortfall', 'required', shortfall)
  }
  addPath(
    drawing,
    'friction-needed',
    'demand',
    segmentsPath([
      [
        { x: needed, y: y - 9 },
        { x: needed, y: y + 9 },
      ],
    ]),
  )
  drawing.placer.avoid(boxAround({ x: needed, y: y - 9 }, { x: needed, y: y + 9 }, 2))
}

/** Values beside the arrows. */
export function labelForces(drawing: Composition): void {
  labelThrust(drawing)
  labelFriction(drawing)
}

function labelThrust(drawing: Composition): void {
  const thrust = thrustArrow(drawing)
  if (!thrust) return
  const { frame, input, placer } = drawing
  const { total } = input.evaluation.thrust
  const force = { value: total, kind: 'forcePerLength' } as const
  const label = valueLabel(drawing, 'thrust-value', 'labelForce', drawingText('thrust', { force }))
  const surface = levelY(frame, input.case.water.depth)
  const { to, from } = thrust
  const end = Math.max(to.x, from.x)
  const { centre, radius } = drawing.body.unloaded
  const clear = centre.x - radius - 8
  const spots: Spot[] = [
    { x: end - 10, y: to.y - 12, anchor: 'end' },
    { x: clear, y: to.y - 12, anchor: 'end' },
    { x: Math.min(to.x, from.x) - 12, y: to.y + 4, anchor: 'end' },
    { x: end - 10, y: to.y - 28, anchor: 'end' },
    { x: to.x - 4, y: surface - 8, anchor: 'end' },
    { x: clear, y: surface - 8, anchor: 'end' },
    { x: to.x - 4, y: surface - 26, anchor: 'end' },
    { x: clear, y: surface - 26, anchor: 'end' },
  ]
  placer.placeSurely(label, spots)
}

function labelFriction(drawing: Composition): void {
  const friction = frictionArrow(drawing)
  if (!friction) return
  const { placer, input, frame } = drawing
  const { to, from } = friction.arrow
  const short = frame.layout.name !== 'wide'
  const force = { value: frictionResistance(input), kind: 'forcePerLength' } as const
  const message = drawingText(short ? 'frictionShort' : 'friction', { force })
  const y = to.y + 11 + frame.layout.font
  placer.place(valueLabel(drawing, 'friction-value', 'labelGround', message), [
    { x: to.x, y, anchor: 'start' },
    { x: Math.max(from.x, friction.needed ?? 0) + 10, y: to.y + 4, anchor: 'start' },
    { x: frame.width - 10, y, anchor: 'end' },
  ])
  if (frame.layout.name === 'narrow' || friction.needed === null) return
  const { utilisation } = input.evaluation.sliding
  const needed = {
    value: frictionResistance(input) * (utilisation ?? 0),
    kind: force.kind,
  } as const
  placer.place(
    quietLabel(drawing, 'friction-needed-value', drawingText('needed', { force: needed })),
    [
      { x: Math.max(from.x, friction.needed) + 10, y: to.y + 4, anchor: 'start' },
      { x: to.x, y: y + frame.layout.small + 4, anchor: 'start' },
    ],
  )
}
