import {
  locatedStations,
  offsetPath,
  pathBetween,
  pointAt,
  type GridPoint,
} from '../../calc/line/line-path'
import type { Verdict } from '../../schemas/section-result'
import { verdictShape } from '../long-section/verdict-shape'
import { areaPath, linePath, reversed, segmentsPath } from '../path-data'
import type { Point, SceneItem, ShapeRole } from '../scene'
import { markShape } from './mark-shape'
import type { PlanFrame } from './plan-frame'
import type { PlanInput } from './plan-input'

const SECTION_ROLES: Readonly<Record<Verdict, ShapeRole>> = {
  holds: 'sectionHolds',
  narrow: 'sectionNarrow',
  fails: 'sectionFails',
  notChecked: 'sectionUnchecked',
}

/** Side of the mark of a verdict, and least length of a section that gets one [px]. */
const MARK = 9

/** Width of the strip of water beside the line [px]. */
const WATER = 34

/** Everything of a plan that is not a text, in the order in which it is painted. */
export function planShapes(input: PlanInput, frame: PlanFrame): readonly SceneItem[] {
  const items: SceneItem[] = []
  const add: Add = (id, role, d) => {
    if (d !== '') items.push({ kind: 'path', id, role, d })
  }
  addWater(input, frame, add)
  addAlternative(input, frame, add)
  addTubes(input, frame, add)
  addLine(input, frame, add)
  addVerdicts(input, frame, add)
  addMarks(input, frame, add)
  addPlace(input, frame, add)
  addScale(input, frame, add)
  return items
}

type Add = (id: string, role: ShapeRole, d: string) => void

const drawn = (frame: PlanFrame, path: readonly GridPoint[]): readonly Point[] =>
  path.map(frame.toPoint)

/** Water lies to the right when walking up the chainage. */
function addWater({ stations }: PlanInput, frame: PlanFrame, add: Add): void {
  const path = locatedStations(stations)
  const outer = offsetPath(path, -WATER / frame.scale)
  add('water', 'waterOverlay', areaPath([...drawn(frame, path), ...reversed(drawn(frame, outer))]))
}

function addAlternative({ alternative }: PlanInput, frame: PlanFrame, add: Add): void {
  if (!alternative) return
  add('alternative', 'curveAlternative', linePath(drawn(frame, locatedStations(alternative))))
}

/** Skirt and tube to scale: the line is the weld, the skirt lies on the wet side of it. */
function addTubes({ stations, runs, sections }: PlanInput, frame: PlanFrame, add: Add): void {
  const path = locatedStations(stations)
  runs.forEach((run, index) => {
    const stretch = pathBetween(path, run.from, run.to)
    const strip = (a: number, b: number) =>
      areaPath([
        ...drawn(frame, offsetPath(stretch, a)),
        ...reversed(drawn(frame, offsetPath(stretch, b))),
      ])
    const centre = run.contactWidth / 2
    const radius = run.diameter / 2
    add(`skirt-${index}`, 'ghostFill', strip(-run.skirtLength, 0))
    add(`tube-${index}`, 'barrierFill', strip(centre - radius, centre + radius))
    add(`tube-edge-${index}`, 'tubeEdge', strip(centre - radius, centre + radius))
  })
  const joints = sections.slice(1).flatMap(({ from }): (readonly [Point, Point])[] => {
    const run = runs.find((candidate) => candidate.from <= from && from <= candidate.to)
    if (!run) return []
    const around = pathBetween(path, Math.max(from - 0.01, path[0]!.chainage), from + 0.01)
    const [, wet] = offsetPath(around, -run.skirtLength)
    const [, dry] = offsetPath(around, run.diameter)
    return wet && dry ? [[frame.toPoint(wet), frame.toPoint(dry)]] : []
  })
  add('joints', 'joint', segmentsPath(joints))
}

function addLine({ stations }: PlanInput, frame: PlanFrame, add: Add): void {
  const path = locatedStations(stations)
  add('line', 'groundLine', linePath(drawn(frame, path)))
  const length = 5 / frame.scale
  const ticks = offsetPath(path, length).map((dry, i): readonly [Point, Point] => [
    frame.toPoint(path[i]!),
    frame.toPoint(dry),
  ])
  add('stations', 'groundLine', segmentsPath(ticks))
}

/** Where the marks of verdicts stand: on the dry side of the middle of their sections. */
export function verdictPoints(
  { stations, sections }: PlanInput,
  frame: PlanFrame,
): readonly { readonly verdict: Verdict; readonly point: Point }[] {
  const path = locatedStations(stations)
  return sections.flatMap(({ from, to, verdict }) => {
    if ((to - from) * frame.scale < MARK + 2) return []
    const middle = (from + to) / 2
    const around = pathBetween(path, middle - 0.01, middle + 0.01)
    const [, beside] = offsetPath(around, 14 / frame.scale)
    return beside ? [{ verdict, point: frame.toPoint(beside) }] : []
  })
}

function addVerdicts(input: PlanInput, frame: PlanFrame, add: Add): void {
  const points = verdictPoints(input, frame)
  for (const verdict of ['holds', 'narrow', 'fails', 'notChecked'] as const) {
    const d = points
      .filter((mark) => mark.verdict === verdict)
      .map(({ point }) => verdictShape(verdict, point, MARK))
      .join('')
    add(`sections-${verdict}`, SECTION_ROLES[verdict], d)
  }
}

/** Where a mark lies: beside the line by its offset, the dry side positive. */
export function markPoint({ stations }: PlanInput, chainage: number, offset: number): GridPoint {
  const path = locatedStations(stations)
  const around = pathBetween(path, chainage - 0.01, chainage + 0.01)
  return offsetPath(around, offset)[1] ?? pointAt(path, chainage)
}

function addMarks(input: PlanInput, frame: PlanFrame, add: Add): void {
  input.marks.forEach(({ kind, chainage, offset }, index) => {
    const role = input.flowing.includes(index) ? 'sectionFails' : 'sectionUnchecked'
    const point = frame.toPoint(markPoint(input, chainage, offset ?? 0))
    add(`mark-${index}`, role, markShape(kind, point))
  })
}

function addPlace({ stations, place, weakest }: PlanInput, frame: PlanFrame, add: Add): void {
  const path = locatedStations(stations)
  if (weakest) {
    const { x, y } = frame.toPoint(pointAt(path, weakest.chainage))
    const mark = [
      { x: x + 8, y },
      { x: x + 19, y: y - 6 },
      { x: x + 19, y: y + 6 },
    ]
    add('weakest', 'weakest', areaPath(mark))
  }
  if (place === null) return
  const { x, y } = frame.toPoint(pointAt(path, place))
  add('place', 'placeLine', ring(x, y, 9))
}

function ring(x: number, y: number, r: number): string {
  const point = (turn: number) => ({ x: x + r * Math.cos(turn), y: y + r * Math.sin(turn) })
  return areaPath(Array.from({ length: 24 }, (_, i) => point((i * Math.PI) / 12)))
}

/** Length of the scale bar in px, and the length that it stands for [m]. */
export function scaleBar({ scale }: PlanFrame): { readonly length: number; readonly px: number } {
  const wanted = 90 / scale
  const power = 10 ** Math.floor(Math.log10(wanted))
  const step = [5, 2, 1].find((candidate) => candidate * power <= wanted + 1e-12) ?? 1
  return { length: step * power, px: step * power * scale }
}

/** Scale bar at the lower left, and the direction of the grid's y at the upper right. */
function addScale({ view }: PlanInput, frame: PlanFrame, add: Add): void {
  const { px } = scaleBar(frame)
  const y = view.height - 14
  add(
    'scale-bar',
    'dimension',
    segmentsPath([
      [
        { x: 14, y },
        { x: 14 + px, y },
      ],
      [
        { x: 14, y: y - 4 },
        { x: 14, y: y + 4 },
      ],
      [
        { x: 14 + px, y: y - 4 },
        { x: 14 + px, y: y + 4 },
      ],
    ]),
  )
  const middle = { x: view.width - 26, y: 30 }
  const along = { x: Math.sin(frame.turn), y: -Math.cos(frame.turn) }
  const at = (far: number, aside: number) => ({
    x: middle.x + far * along.x - aside * along.y,
    y: middle.y + far * along.y + aside * along.x,
  })
  add('grid-y', 'staff', areaPath([at(15, 0), at(-11, 6), at(-6, 0), at(-11, -6)]))
}
