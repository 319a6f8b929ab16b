import { groundLevelAt } from '../../calc/line/line-sections'
import type { Verdict } from '../../schemas/section-result'
import { areaPath, linePath, segmentsPath } from '../path-data'
import type { Point, SceneItem, ShapeRole } from '../scene'
import type { LongFrame } from './long-frame'
import { addLongMarks } from './long-marks'
import type { LongSectionInput } from './long-section-input'
import { verdictShape } from './verdict-shape'

const SECTION_ROLES: Readonly<Record<Verdict, ShapeRole>> = {
  holds: 'sectionHolds',
  narrow: 'sectionNarrow',
  fails: 'sectionFails',
  notChecked: 'sectionUnchecked',
}

/** Height of the strip of verdicts, and least width of a section that gets a shape [px]. */
const STRIP = 4
const MARK = 9

/** Everything of a long section that is not a text, in the order in which it is painted. */
export function longShapes(input: LongSectionInput, frame: LongFrame): readonly SceneItem[] {
  const items: SceneItem[] = []
  const add = (id: string, role: ShapeRole, d: string) => {
    if (d !== '') items.push({ kind: 'path', id, role, d })
  }
  const { left, right, top, bottom } = frame
  const across = (y: number): readonly [Point, Point] => [
    { x: left, y },
    { x: right, y },
  ]
  add('grid', 'grid', segmentsPath(frame.levelTicks.map((level) => across(frame.toY(level)))))
  addTubes(input, frame, add)
  addWater(input, frame, add)
  addGround(input, frame, add)
  addLimits(input, frame, add)
  add(
    'axes',
    'axis',
    linePath([
      { x: left, y: top },
      { x: left, y: bottom },
      { x: right, y: bottom },
    ]),
  )
  addLongMarks(input, frame, add)
  addVerdicts(input, frame, add)
  addPlace(input, frame, add)
  return items
}

type Add = (id: string, role: ShapeRole, d: string) => void

interface Stretch {
  readonly from: number
  readonly to: number
  /** Height above the ground [m]. */
  readonly raise?: number
}

/** Ground between two chainages, with every station in between. */
function groundPoints(
  { stations }: LongSectionInput,
  frame: LongFrame,
  { from, to, raise = 0 }: Stretch,
): readonly Point[] {
  const inside = stations.filter(({ chainage }) => chainage > from && chainage < to)
  const chainages = [from, ...inside.map(({ chainage }) => chainage), to]
  return chainages.map((chainage) => ({
    x: frame.toX(chainage),
    y: frame.toY(groundLevelAt(stations, chainage) + raise),
  }))
}

function addGround(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const surface = groundPoints(input, frame, frame)
  const { right, left, bottom } = frame
  add('ground', 'ground', areaPath([...surface, { x: right, y: bottom }, { x: left, y: bottom }]))
  add('ground-line', 'groundLine', linePath(surface))
  const ticks = input.stations.map(({ chainage, groundLevel }): readonly [Point, Point] => {
    const x = frame.toX(chainage)
    const y = frame.toY(groundLevel)
    return [
      { x, y },
      { x, y: y + 5 },
    ]
  })
  add('stations', 'groundLine', segmentsPath(ticks))
}

/** Water stands wherever the level is above the ground; it is drawn from surface to ground. */
function addWater(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const { waterLevel } = input
  if (waterLevel === null) return
  const y = frame.toY(waterLevel)
  const { left, right } = frame
  const ground = groundPoints(input, frame, frame)
  const below = [...ground].reverse().map((point) => ({ x: point.x, y: Math.max(point.y, y) }))
  add('water', 'waterOverlay', areaPath([{ x: left, y }, { x: right, y }, ...below]))
  add(
    'water-line',
    'waterLine',
    segmentsPath([
      [
        { x: left, y },
        { x: right, y },
      ],
    ]),
  )
}

/** The tubes as they lie on the ground, each section by itself. */
function addTubes(input: LongSectionInput, frame: LongFrame, add: Add): void {
  input.runs.forEach(({ from, to, diameter }, index) => {
    const start = Math.max(from, frame.from)
    const end = Math.min(to, frame.to)
    if (end <= start) return
    const crest = groundPoints(input, frame, { from: start, to: end, raise: diameter })
    const foot = [...groundPoints(input, frame, { from: start, to: end })].reverse()
    add(`tube-${index}`, 'barrierFill', areaPath([...crest, ...foot]))
    add(`tube-edge-${index}`, 'tubeEdge', linePath([foot.at(-1)!, ...crest, foot[0]!]))
  })
  const joints = input.sections.slice(1).flatMap(({ from }): (readonly [Point, Point])[] => {
    const run = input.runs.find((candidate) => candidate.from < from && from < candidate.to)
    if (!run) return []
    const [foot] = groundPoints(input, frame, { from, to: from })
    return [
      [foot!, { x: foot!.x, y: frame.toY(groundLevelAt(input.stations, from) + run.diameter) }],
    ]
  })
  add('joints', 'joint', segmentsPath(joints))
}

/** Level to which each section holds, and the lowest of them through the whole line. */
function addLimits(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const steps = input.sections.flatMap(
    ({ from, to, holdsToLevel }): (readonly [Point, Point])[] => {
      if (holdsToLevel === null) return []
      const y = frame.toY(holdsToLevel)
      if (y < frame.top) return []
      return [
        [
          { x: frame.toX(from) + 1, y },
          { x: frame.toX(to) - 1, y },
        ],
      ]
    },
  )
  add('holds-to-steps', 'holdsTo', segmentsPath(steps))
  const level = input.weakest?.holdsToLevel ?? null
  if (level === null) return
  const y = frame.toY(level)
  add(
    'holds-to',
    'holdsToLine',
    segmentsPath([
      [
        { x: frame.left, y },
        { x: frame.right, y },
      ],
    ]),
  )
}

/** Middle of the strip of verdicts under the axis. */
export function stripY(frame: LongFrame): number {
  return frame.bottom + 1.9 * frame.font
}

function addVerdicts(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const y = stripY(frame)
  for (const verdict of ['holds', 'narrow', 'fails', 'notChecked'] as const) {
    const d = input.sections
      .filter((section) => section.verdict === verdict)
      .map(({ from, to }) => {
        const [start, end] = [frame.toX(from) + 0.75, frame.toX(to) - 0.75]
        const middle = { x: (start + end) / 2, y }
        if (end - start >= MARK + 3) return verdictShape(verdict, middle, MARK)
        return areaPath([
          { x: start, y: y - STRIP / 2 },
          { x: end, y: y - STRIP / 2 },
          { x: end, y: y + STRIP / 2 },
          { x: start, y: y + STRIP / 2 },
        ])
      })
      .join('')
    add(`sections-${verdict}`, SECTION_ROLES[verdict], d)
  }
}

function addPlace(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const { place, weakest } = input
  if (weakest) {
    const x = frame.toX(weakest.chainage)
    const level = weakest.holdsToLevel ?? groundLevelAt(input.stations, weakest.chainage)
    const y = frame.toY(level)
    add('weakest', 'weakest', weakestMark({ x, y }))
  }
  if (place === null) return
  const x = frame.toX(place)
  add(
    'place',
    'placeLine',
    segmentsPath([
      [
        { x, y: frame.top - 4 },
        { x, y: frame.bottom },
      ],
    ]),
  )
}

/** A triangle that points down at the limit of the weakest section. */
function weakestMark({ x, y }: Point): string {
  return areaPath([
    { x, y: y - 1 },
    { x: x - 6, y: y - 11 },
    { x: x + 6, y: y - 11 },
  ])
}
