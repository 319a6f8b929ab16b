import { groundLevelAt } from '../../calc/line/line-sections'
import { lineTurns } from '../../calc/line/line-turns'
import { lowSpots } from '../../calc/line/low-spots'
import { endTop } from '../../checks/water-ways'
import type { LineMark } from '../../schemas/mark'
import type { LabelPlacer } from '../label-placer'
import { areaPath, segmentsPath } from '../path-data'
import { markShape } from '../plan/mark-shape'
import type { Point, ShapeRole } from '../scene'
import type { LongFrame } from './long-frame'
import type { LongSectionInput } from './long-section-input'

type Add = (id: string, role: ShapeRole, d: string) => void

/** Band of the level, loaded crest, turns, low spots, ends and marks of a long section. */
export function addLongMarks(input: LongSectionInput, frame: LongFrame, add: Add): void {
  addBand(input, frame, add)
  addCrest(input, frame, add)
  addFreeboard(input, frame, add)
  addTurns(input, frame, add)
  addLowSpots(input, frame, add)
  addEnds(input, frame, add)
  visibleMarks(input, frame).forEach(({ mark, index }) => {
    const role = input.flowing?.includes(index) ? 'sectionFails' : 'sectionUnchecked'
    add(`mark-${index}`, role, markShape(mark.kind, markAt(input, frame, mark)))
  })
}

const isIn = (frame: LongFrame, chainage: number): boolean =>
  frame.from <= chainage && chainage <= frame.to

/** Marks in the window, turns left out: they are drawn from the line. */
function visibleMarks({ marks = [] }: LongSectionInput, frame: LongFrame) {
  return marks
    .map((mark, index) => ({ mark, index }))
    .filter(({ mark }) => mark.kind !== 'turn' && isIn(frame, mark.chainage))
}

/** What lies under the ground stands at its own level, anything else on the ground. */
function markAt({ stations }: LongSectionInput, frame: LongFrame, mark: LineMark): Point {
  const ground = groundLevelAt(stations, mark.chainage)
  const level = mark.level === null ? ground : Math.min(mark.level, ground)
  const y = Math.min(frame.bottom - 7, frame.toY(level))
  return { x: frame.toX(mark.chainage), y: Math.max(frame.top + 7, y) }
}

function addBand({ band }: LongSectionInput, frame: LongFrame, add: Add): void {
  const across = (level: number): readonly [Point, Point] => [
    { x: frame.left, y: frame.toY(level) },
    { x: frame.right, y: frame.toY(level) },
  ]
  const ends = [band?.low ?? null, band?.high ?? null].filter((level) => level !== null)
  if (ends.length === 2) {
    const [low, high] = ends.map(across)
    add('band', 'waterOverlay', areaPath([...low!, high![1], high![0]]))
  }
  add('band-ends', 'levelLine', segmentsPath(ends.map(across)))
}

function addCrest({ sections }: LongSectionInput, frame: LongFrame, add: Add): void {
  const steps = sections.flatMap(({ from, to, crestLevel }): (readonly [Point, Point])[] => {
    if (crestLevel === null || crestLevel === undefined) return []
    const y = frame.toY(crestLevel)
    return [
      [
        { x: frame.toX(from) + 1, y },
        { x: frame.toX(to) - 1, y },
      ],
    ]
  })
  add('crest', 'ghost', segmentsPath(steps))
}

/** What stands between water and loaded crest at the place that is looked at. */
function freeboardAt({ sections, place, waterLevel }: LongSectionInput) {
  if (place === null || waterLevel === null) return null
  const section = sections.find(({ from, to }) => from <= place && place <= to)
  const crest = section?.crestLevel ?? null
  return crest === null || crest <= waterLevel ? null : { place, waterLevel, crest }
}

function addFreeboard(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const found = freeboardAt(input)
  if (!found) return
  const x = frame.toX(found.place) + 7
  const [low, high] = [frame.toY(found.waterLevel), frame.toY(found.crest)]
  const tick = (y: number): readonly [Point, Point] => [
    { x: x - 3, y },
    { x: x + 3, y },
  ]
  const post: readonly [Point, Point] = [
    { x, y: low },
    { x, y: high },
  ]
  add('freeboard', 'dimension', segmentsPath([post, tick(low), tick(high)]))
}

function addTurns({ stations, marks = [] }: LongSectionInput, frame: LongFrame, add: Add): void {
  const lines = lineTurns(stations, marks).map(({ chainage }): readonly [Point, Point] => {
    const x = frame.toX(chainage)
    return [
      { x, y: frame.top },
      { x, y: frame.toY(groundLevelAt(stations, chainage)) },
    ]
  })
  add('turns', 'witness', segmentsPath(lines))
}

function addLowSpots({ stations }: LongSectionInput, frame: LongFrame, add: Add): void {
  const d = lowSpots(stations)
    .map(({ chainage, groundLevel }) => {
      const [x, y] = [frame.toX(chainage), frame.toY(groundLevel)]
      return areaPath([
        { x, y: y + 1 },
        { x: x - 5, y: y + 9 },
        { x: x + 5, y: y + 9 },
      ])
    })
    .join('')
  add('low-spots', 'levelMark', d)
}

/** A post as high as what the line ties into. */
function addEnds(input: LongSectionInput, frame: LongFrame, add: Add): void {
  const { ends, stations } = input
  if (!ends || stations.length < 2 || input.window) return
  for (const side of ['start', 'end'] as const) {
    const station = side === 'start' ? stations[0]! : stations[stations.length - 1]!
    const end = ends[side]
    const top = endTop(end, station)
    if (end.kind !== 'wall' || top === null) continue
    const x = frame.toX(station.chainage)
    const y = Math.max(frame.top, frame.toY(top))
    const width = side === 'start' ? 6 : -6
    const foot = frame.toY(station.groundLevel)
    const post = [
      { x, y },
      { x: x + width, y },
      { x: x + width, y: foot },
      { x, y: foot },
    ]
    add(`end-${side}`, 'friction', areaPath(post))
  }
}

/** Words of turns, low spots, ends, marks and the band, where there is room for them. */
export function labelLongMarks(
  input: LongSectionInput,
  frame: LongFrame,
  placer: LabelPlacer,
): void {
  const size = frame.font - 1
  const { stations, marks = [], band } = input
  for (const { mark, index } of visibleMarks(input, frame)) {
    const { x, y } = markAt(input, frame, mark)
    const isFlowing = input.flowing?.includes(index) ?? false
    const message = { key: `linePlan.drawing.mark.${isFlowing ? 'open' : 'shut'}.${mark.kind}` }
    const role = isFlowing ? 'labelFails' : 'labelQuiet'
    placer.placeOverLines({ id: `mark-label-${index}`, role, message, size }, [
      { x: x + 11, y: y + 4, anchor: 'start' },
      { x: x - 11, y: y + 4, anchor: 'end' },
      { x, y: y - 11, anchor: 'middle' },
      { x, y: y + 20, anchor: 'middle' },
    ])
  }
  for (const { chainage, angle } of lineTurns(stations, marks)) {
    const degrees = String(Math.round(Math.abs((angle * 180) / Math.PI)))
    const message = {
      key: `linePlan.drawing.turn.${angle > 0 ? 'left' : 'right'}`,
      values: { degrees },
    }
    const x = frame.toX(chainage)
    placer.place({ id: `turn-${chainage}`, role: 'labelQuiet', message, size }, [
      { x: x + 4, y: frame.top + size, anchor: 'start' },
      { x: x - 4, y: frame.top + size, anchor: 'end' },
    ])
  }
  for (const { chainage, groundLevel } of lowSpots(stations)) {
    const level = { value: groundLevel, kind: 'length' } as const
    const label = { id: `low-${chainage}`, role: 'labelWater', size } as const
    const message = { key: 'linePlan.section.low', values: { level } }
    const y = frame.toY(groundLevel) + 12 + size
    placer.placeOverLines({ ...label, message }, [
      { x: frame.toX(chainage), y, anchor: 'middle' },
      { x: frame.toX(chainage) + 8, y, anchor: 'start' },
    ])
  }
  if (band && band.low !== null && band.high !== null) {
    const [low, high] = [band.low, band.high].map((value) => ({ value, kind: 'length' }) as const)
    const message = { key: 'linePlan.section.band', values: { low: low!, high: high! } }
    placer.place({ id: 'band-label', role: 'labelWater', message, size }, [
      { x: frame.right - 4, y: frame.toY(band.high) - 5, anchor: 'end' },
      { x: frame.left + 6, y: frame.toY(band.high) - 5, anchor: 'start' },
    ])
  }
}
