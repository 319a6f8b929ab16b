import { lineTurns } from '../../calc/line/line-turns'
import { locatedStations, offsetPath, pointAt } from '../../calc/line/line-path'
import type { Message } from '../../texts/format-text'
import type { Label, LabelPlacer, Spot } from '../label-placer'
import { niceAbove } from '../nice-ticks'
import type { Point, TextRole } from '../scene'
import type { PlanFrame } from './plan-frame'
import type { PlanInput } from './plan-input'
import { markPoint, scaleBar, verdictPoints } from './plan-shapes'

/** Px between two chainages that are written, at least. */
const CHAINAGE_STEP = 46

/** Names and figures of a plan, by importance. */
export function labelPlan(input: PlanInput, frame: PlanFrame, placer: LabelPlacer): void {
  const write = writer(frame, placer)
  keepClear(input, frame, placer)
  const { view } = input
  const bar = scaleBar(frame)
  write('scale', 'labelQuiet', lengthOf(bar.length), [
    { x: 20 + bar.px, y: view.height - 10, anchor: 'start' },
  ])
  write('grid-label', 'labelQuiet', { key: 'linePlan.drawing.grid' }, [
    { x: view.width - 42, y: 34, anchor: 'end' },
  ])
  labelWeakest(input, frame, write)
  labelMarks(input, frame, write)
  labelEnds(input, frame, write)
  labelTurns(input, frame, write)
  labelSides(input, frame, write)
  labelChainages(input, frame, write)
}

/** Words keep off the marks of verdicts, and where they can off the line. */
function keepClear(input: PlanInput, frame: PlanFrame, placer: LabelPlacer): void {
  const around = ({ x, y }: Point, r: number) => ({
    left: x - r,
    right: x + r,
    top: y - r,
    bottom: y + r,
  })
  for (const { point } of verdictPoints(input, frame)) placer.reserve(around(point, 6))
  for (const { chainage, offset } of input.marks) {
    placer.reserve(around(frame.toPoint(markPoint(input, chainage, offset ?? 0)), 7))
  }
  const path = locatedStations(input.stations)
  const [first, last] = [path[0]!.chainage, path[path.length - 1]!.chainage]
  const count = Math.min(400, Math.ceil(((last - first) * frame.scale) / 10))
  for (let i = 0; i <= count; i += 1) {
    const point = frame.toPoint(pointAt(path, first + ((last - first) * i) / Math.max(1, count)))
    placer.avoid(around(point, 4))
  }
}

type Write = (id: string, role: TextRole, message: Message, spots: readonly Spot[]) => void

function writer(frame: PlanFrame, placer: LabelPlacer): Write {
  return (id, role, message, spots) => {
    const label: Label = { id, role, message, size: frame.font - 1 }
    if (!placer.place(label, spots)) placer.placeOverLines(label, spots)
  }
}

function lengthOf(length: number): Message {
  const decimals = length < 1 ? 1 : 0
  const value = { value: length, kind: 'length', decimals } as const
  return { key: 'linePlan.drawing.length', values: { length: value } }
}

/** Spots to the right of a point first, where the dry side is, then around it. */
function around({ x, y }: Point, far: number): readonly Spot[] {
  return [
    { x: x + far, y: y + 4, anchor: 'start' },
    { x: x + far, y: y - 9, anchor: 'start' },
    { x: x + far, y: y + 17, anchor: 'start' },
    { x: x - far, y: y + 4, anchor: 'end' },
    { x, y: y - far, anchor: 'middle' },
    { x, y: y + far + 9, anchor: 'middle' },
  ]
}

function labelWeakest({ stations, weakest }: PlanInput, frame: PlanFrame, write: Write): void {
  if (!weakest) return
  const point = frame.toPoint(pointAt(locatedStations(stations), weakest.chainage))
  const chainage = String(Number(weakest.chainage.toFixed(2)))
  const { holdsToLevel } = weakest
  const message: Message =
    holdsToLevel === null
      ? { key: 'linePage.drawing.weakestNone', values: { chainage } }
      : {
          key: 'linePage.drawing.weakest',
          values: { chainage, level: { value: holdsToLevel, kind: 'length', rounding: 'down' } },
        }
  write('weakest-label', 'labelHolds', message, around(point, 24))
}

function labelMarks(input: PlanInput, frame: PlanFrame, write: Write): void {
  input.marks.forEach(({ kind, chainage, offset }, index) => {
    const point = frame.toPoint(markPoint(input, chainage, offset ?? 0))
    const role: TextRole = input.flowing.includes(index) ? 'labelFails' : 'labelQuiet'
    const state = input.flowing.includes(index) ? 'open' : 'shut'
    const message = { key: `linePlan.drawing.mark.${state}.${kind}` }
    write(`mark-label-${index}`, role, message, around(point, 11))
  })
}

function labelEnds({ stations, ends }: PlanInput, frame: PlanFrame, write: Write): void {
  const path = locatedStations(stations)
  for (const side of ['start', 'end'] as const) {
    const place = side === 'start' ? path[0]! : path[path.length - 1]!
    const { kind } = ends[side]
    const role: TextRole = kind === 'open' ? 'labelFails' : 'label'
    write(
      `end-${side}`,
      role,
      { key: `linePlan.endKind.${kind}` },
      around(frame.toPoint(place), 12),
    )
  }
}

function labelTurns({ stations, marks }: PlanInput, frame: PlanFrame, write: Write): void {
  const path = locatedStations(stations)
  for (const { chainage, angle } of lineTurns(stations, marks)) {
    const side = angle > 0 ? 'left' : 'right'
    const degrees = String(Math.round(Math.abs((angle * 180) / Math.PI)))
    const message = { key: `linePlan.drawing.turn.${side}`, values: { degrees } }
    const point = frame.toPoint(pointAt(path, chainage))
    write(`turn-${chainage}`, 'labelQuiet', message, around(point, 22))
  }
}

/** The words "water" and "dry side" stand beside the middle of the line. */
function labelSides({ stations }: PlanInput, frame: PlanFrame, write: Write): void {
  const path = locatedStations(stations)
  const spots = (far: number, anchor: 'start' | 'end') =>
    offsetPath(path, far / frame.scale).map((place) => ({ ...frame.toPoint(place), anchor }))
  write('water-side', 'labelWater', { key: 'linePlan.drawing.water' }, spots(-40, 'end'))
  write('dry-side', 'labelDry', { key: 'linePlan.drawing.dry' }, spots(60, 'start'))
}

function labelChainages({ stations }: PlanInput, frame: PlanFrame, write: Write): void {
  const path = locatedStations(stations)
  const [first, last] = [path[0]!.chainage, path[path.length - 1]!.chainage]
  const step = niceAbove(CHAINAGE_STEP / frame.scale)
  const start = Math.ceil(first / step - 1e-9)
  const count = Math.min(400, Math.floor(last / step + 1e-9) - start + 1)
  for (let i = 0; i < count; i += 1) {
    const chainage = Number(((start + i) * step).toPrecision(12))
    const point = frame.toPoint(pointAt(path, chainage))
    const message = { key: 'linePage.drawing.chainage', values: { chainage: String(chainage) } }
    write(`chainage-${chainage}`, 'labelQuiet', message, around(point, 9))
  }
}
