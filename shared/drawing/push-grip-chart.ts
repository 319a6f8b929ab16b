import { niceShownTicks } from './nice-ticks'
import { LabelPlacer, type Label } from './label-placer'
import { areaPath, linePath, segmentsPath } from './path-data'
import type { Point, Scene, SceneItem, ShapeRole, TextRole, View } from './scene'
import type { MeasureText } from './text-width'
import type { Message } from '../texts/format-text'
import type { UnitSystem } from '../units'
import { demoText } from './demonstration/demo-text'

/** Push and grip at one depth [m, N/m]. */
export interface PushGripPoint {
  readonly depth: number
  readonly push: number
  readonly grip: number
}

/** Everything that the chart of push against grip needs. */
export interface PushGripInput {
  /** In order of depth, from 0 to the end of the axis. */
  readonly points: readonly PushGripPoint[]
  /** How far the curves are drawn: the depth of the water now [m]. */
  readonly now: number
  /** Where they cross, and where we stop [m]; null: not shown. */
  readonly crossing: number | null
  readonly stop: number | null
  /** Guess of the room [m] and its words. */
  readonly guess: { readonly value: number; readonly message: Message } | null
  readonly units: UnitSystem
  readonly view: View
  readonly measure: MeasureText
}

interface Frame {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
  readonly font: number
  readonly greatest: number
  readonly toX: (depth: number) => number
  readonly toY: (force: number) => number
}

/** From this width on the type is larger [px]. */
const WIDE_FROM = 420

function frameOf({ points, view }: PushGripInput): Frame {
  const font = view.width >= WIDE_FROM ? 16 : 13
  const [left, right] = [14, view.width - 14]
  const [top, bottom] = [2.6 * font, view.height - 2.9 * font]
  const greatest = points.at(-1)?.depth ?? 1
  const most = Math.max(1, ...points.map(({ push, grip }) => Math.max(push, grip)))
  return {
    ...{ left, right, top, bottom, font, greatest },
    toX: (depth) => left + ((right - left) * depth) / greatest,
    toY: (force) => bottom - ((bottom - top) * force) / most,
  }
}

/** Push against grip as the level rises: both curves are drawn no further than the water has come. */
export function pushGripScene(input: PushGripInput): Scene {
  const frame = frameOf(input)
  const placer = new LabelPlacer(input.view, input.measure)
  const items: SceneItem[] = []
  const add = (id: string, role: ShapeRole, d: string) => {
    if (d !== '') items.push({ kind: 'path', id, role, d })
  }
  const corner = { x: frame.left, y: frame.bottom }
  add(
    'axes',
    'axis',
    linePath([{ x: frame.left, y: frame.top }, corner, { x: frame.right, y: frame.bottom }]),
  )
  const upright = (depth: number): [Point, Point] => [
    { x: frame.toX(depth), y: frame.top - 4 },
    { x: frame.toX(depth), y: frame.bottom },
  ]
  const seen = seenPoints(input)
  const curve = (of: 'push' | 'grip') =>
    seen.map((point) => ({ x: frame.toX(point.depth), y: frame.toY(point[of]) }))
  const [push, grip] = [curve('push'), curve('grip')]
  const foot = [{ x: push.at(-1)?.x ?? frame.left, y: frame.bottom }, corner]
  if (push.length > 1) add('push-area', 'shortfall', areaPath([...push, ...foot]))
  add('grip', 'skirt', linePath(grip))
  add('push', 'curve', linePath(push))
  if (input.guess) add('guess', 'guess', segmentsPath([upright(input.guess.value)]))
  if (input.stop !== null) add('stop', 'leave', segmentsPath([upright(input.stop)]))
  if (input.crossing !== null) items.push(crossingDot(input, frame, input.crossing))
  labelAxis(input, frame, placer)
  labelMarks(input, frame, placer)
  labelCurves(frame, placer, push.at(-1), grip.at(-1))
  return {
    width: input.view.width,
    height: input.view.height,
    title: demoText('chartTitle'),
    description: [demoText('chartDescribe', { depth: { value: input.now, kind: 'length' } })],
    items: [...items, ...placer.placed],
  }
}

/** Points that the water has reached, and one at the water itself. */
function seenPoints({ points, now }: PushGripInput): readonly PushGripPoint[] {
  const below = points.filter(({ depth }) => depth <= now)
  return below.length > 0 ? [...below, interpolated(points, now)] : []
}

/** Push and grip between two computed depths. */
function interpolated(points: readonly PushGripPoint[], depth: number): PushGripPoint {
  const at = points.findIndex((point) => point.depth >= depth)
  const [before, after] = [points[at - 1], points[at] ?? points.at(-1)]
  if (!before || !after) return after ?? { depth, push: 0, grip: 0 }
  const share = (depth - before.depth) / (after.depth - before.depth)
  const between = (from: number, to: number) => from + share * (to - from)
  return {
    depth,
    push: between(before.push, after.push),
    grip: between(before.grip, after.grip),
  }
}

function crossingDot({ points }: PushGripInput, frame: Frame, depth: number): SceneItem {
  const { push } = interpolated(points, depth)
  const [cx, cy] = [frame.toX(depth), frame.toY(push)]
  return { kind: 'circle', id: 'crossing', role: 'nowDot', cx, cy, r: 7 }
}

function label(frame: Frame, id: string, role: TextRole, message: Message): Label {
  return { id, role, message, size: frame.font, weight: 600 }
}

function labelAxis({ units }: PushGripInput, frame: Frame, placer: LabelPlacer): void {
  const small = 0.8 * frame.font
  for (const depth of niceShownTicks(frame.greatest, 4, 'length', units).slice(1)) {
    const message = demoText('tick', { value: { value: depth, kind: 'length', decimals: 1 } })
    const tick: Label = { id: `tick-${depth}`, role: 'labelQuiet', message, size: small }
    placer.place(tick, [
      { x: frame.toX(depth), y: frame.bottom + small + 4, anchor: 'middle' },
      { x: frame.right, y: frame.bottom + small + 4, anchor: 'end' },
    ])
  }
  const name: Label = {
    id: 'axis',
    role: 'labelQuiet',
    message: demoText('depthAxis'),
    size: small,
  }
  placer.put(name, { x: frame.right, y: frame.bottom + 2 * small + 10, anchor: 'end' })
}

function labelMarks(
  { guess, stop, crossing }: PushGripInput,
  frame: Frame,
  placer: LabelPlacer,
): void {
  const depth = (value: number) => ({ depth: { value, kind: 'length', rounding: 'down' } as const })
  if (crossing !== null) {
    const at = label(
      frame,
      'crossing-value',
      'label',
      demoText('crossing', { depth: { value: crossing, kind: 'length' } }),
    )
    placer.placeSurely(at, [{ x: frame.toX(crossing) + 12, y: frame.bottom - 10, anchor: 'start' }])
  }
  if (stop !== null) {
    const at = label(frame, 'stop-value', 'labelNarrow', demoText('stop', depth(stop)))
    placer.placeSurely(at, [{ x: frame.toX(stop) - 8, y: frame.top + frame.font, anchor: 'end' }])
  }
  if (guess) {
    const at = label(frame, 'guess-value', 'label', guess.message)
    placer.placeSurely(at, [{ x: frame.toX(guess.value) + 8, y: frame.top - 8, anchor: 'start' }])
  }
}

function labelCurves(frame: Frame, placer: LabelPlacer, push?: Point, grip?: Point): void {
  if (!push || !grip || push.x < frame.left + 20) return
  const spots = (at: Point) => [
    { x: at.x + 10, y: at.y - 6, anchor: 'start' as const },
    { x: at.x - 10, y: at.y - 10, anchor: 'end' as const },
    { x: at.x + 10, y: at.y + frame.font + 6, anchor: 'start' as const },
  ]
  placer.placeSurely(label(frame, 'grip-name', 'labelBarrier', demoText('gripName')), spots(grip))
  placer.placeSurely(label(frame, 'push-name', 'label', demoText('pushName')), spots(push))
}
