import { groundLevelAt } from '../../calc/line/line-sections'
import { GROUNDS } from '../../catalogue/grounds'
import type { Message } from '../../texts/format-text'
import { boxAround, type LabelPlacer, type Spot } from '../label-placer'
import type { LongFrame } from './long-frame'
import type { LongSectionInput } from './long-section-input'
import { stripY } from './long-shapes'

/** Names and figures of a long section, by importance. */
export function labelLongSection(
  input: LongSectionInput,
  frame: LongFrame,
  placer: LabelPlacer,
): void {
  labelAxes(frame, placer)
  placer.reserve({ left: 0, right: frame.left, top: 0, bottom: frame.bottom })
  const { stations, runs } = input
  for (let i = 1; i < stations.length; i += 1) {
    const [a, b] = [stations[i - 1]!, stations[i]!]
    placer.avoid(boxAround(pointOf(frame, a), pointOf(frame, b), 2))
  }
  labelWeakest(input, frame, placer)
  labelWater(input, frame, placer)
  runs.forEach((_, index) => labelRun(input, frame, placer, index))
  labelSurfaces(input, frame, placer)
  if (input.datum) {
    const message = { key: 'linePlan.section.datum', values: { datum: input.datum } }
    placer.place({ id: 'datum', role: 'labelQuiet', message, size: frame.font - 1 }, [
      { x: frame.left + 2, y: frame.font + 2, anchor: 'start' },
    ])
  }
  placer.place(
    {
      id: 'scale',
      role: 'labelQuiet',
      message: {
        key: 'linePage.drawing.exaggeration',
        values: { times: String(frame.exaggeration) },
      },
      size: frame.font - 1,
    },
    [{ x: frame.right, y: frame.font + 2, anchor: 'end' }],
  )
}

function pointOf(frame: LongFrame, at: { chainage: number; groundLevel: number }) {
  return { x: frame.toX(at.chainage), y: frame.toY(at.groundLevel) }
}

function labelAxes(frame: LongFrame, placer: LabelPlacer): void {
  const size = frame.font - 1
  frame.levelTicks.forEach((level, index) => {
    const isLast = index === frame.levelTicks.length - 1
    const value = { value: level, kind: 'length', isBare: !isLast } as const
    const message = { key: 'linePage.drawing.level', values: { level: value } }
    const y = frame.toY(level) + size * 0.35
    placer.place({ id: `level-${level}`, role: 'labelQuiet', message, size }, [
      { x: frame.left - 5, y, anchor: 'end' },
    ])
  })
  const y = frame.bottom + size + 3
  for (const chainage of frame.chainageTicks) {
    const message = { key: 'linePage.drawing.chainage', values: { chainage: String(chainage) } }
    const x = frame.toX(chainage)
    placer.place({ id: `chainage-${chainage}`, role: 'labelQuiet', message, size }, [
      { x, y, anchor: 'middle' },
      { x: frame.right, y, anchor: 'end' },
    ])
  }
}

function labelWeakest(input: LongSectionInput, frame: LongFrame, placer: LabelPlacer): void {
  const { weakest } = input
  if (!weakest) return
  const level = weakest.holdsToLevel ?? groundLevelAt(input.stations, weakest.chainage)
  const x = frame.toX(weakest.chainage)
  const y = frame.toY(level)
  placer.reserve({ left: x - 7, right: x + 7, top: y - 12, bottom: y })
  const chainage = String(Number(weakest.chainage.toFixed(2)))
  const message: Message =
    weakest.holdsToLevel === null
      ? { key: 'linePage.drawing.weakestNone', values: { chainage } }
      : {
          key: 'linePage.drawing.weakest',
          values: {
            chainage,
            level: { value: weakest.holdsToLevel, kind: 'length', rounding: 'down' } as const,
          },
        }
  const spots: Spot[] = [
    { x: x + 8, y: frame.top, anchor: 'start' },
    { x: x - 8, y: frame.top, anchor: 'end' },
    { x, y: y - 16, anchor: 'middle' },
    { x: x + 10, y: y - 5, anchor: 'start' },
    { x: x - 10, y: y - 5, anchor: 'end' },
    { x: x + 10, y: y - 18, anchor: 'start' },
    { x: x - 10, y: y - 18, anchor: 'end' },
    { x: frame.left + 8, y: frame.top - 8, anchor: 'start' },
  ]
  const label = { id: 'weakest-label', role: 'labelHolds', message } as const
  placer.placeSurely({ ...label, size: frame.font, weight: 600 }, spots)
}

function labelWater(input: LongSectionInput, frame: LongFrame, placer: LabelPlacer): void {
  const { waterLevel } = input
  if (waterLevel === null) return
  const y = frame.toY(waterLevel)
  placer.avoid({ left: frame.left, right: frame.right, top: y - 1, bottom: y + 1 })
  const message = {
    key: 'linePage.drawing.water',
    values: { level: { value: waterLevel, kind: 'length' } as const },
  }
  const label = { id: 'water-label', role: 'labelWater', message } as const
  placer.placeSurely({ ...label, size: frame.font, weight: 600 }, [
    { x: frame.left + 6, y: y - 5, anchor: 'start' },
    { x: frame.right - 4, y: y - 5, anchor: 'end' },
    { x: frame.left + 6, y: y + frame.font + 2, anchor: 'start' },
    { x: frame.right - 4, y: y + frame.font + 2, anchor: 'end' },
  ])
}

function labelRun(
  input: LongSectionInput,
  frame: LongFrame,
  placer: LabelPlacer,
  index: number,
): void {
  const { from, to, diameter } = input.runs[index]!
  const middle = (Math.max(from, frame.from) + Math.min(to, frame.to)) / 2
  const ground = groundLevelAt(input.stations, middle)
  const x = frame.toX(middle)
  const width = frame.toX(Math.min(to, frame.to)) - frame.toX(Math.max(from, frame.from))
  const message = {
    key: 'linePage.drawing.tube',
    values: { diameter: { value: diameter, kind: 'length' } as const },
  }
  const label = { id: `run-${index}`, role: 'labelBarrier', message, size: frame.font - 1 } as const
  if (placer.width(label) > width - 4) return
  placer.place(label, [
    { x, y: frame.toY(ground + diameter) - 5, anchor: 'middle' },
    { x, y: frame.toY(ground + diameter) + frame.font + 2, anchor: 'middle' },
    { x, y: frame.toY(ground) - 6, anchor: 'middle' },
  ])
}

/** Surfaces under the strip of verdicts, where their run is long enough for the word. */
function labelSurfaces(input: LongSectionInput, frame: LongFrame, placer: LabelPlacer): void {
  const size = frame.font - 1
  const y = stripY(frame) + size + 9
  for (const { surface, from, to } of surfaceRuns(input, frame)) {
    const middle = frame.toX((from + to) / 2)
    const width = frame.toX(to) - frame.toX(from)
    const message = surfaceName(surface)
    const label = { id: `surface-${from}`, role: 'labelGround', message, size } as const
    if (placer.width(label) > width) continue
    placer.place(label, [{ x: middle, y, anchor: 'middle' }])
  }
}

/** The name of a surface of the catalogue; any other goes by what the survey calls it. */
function surfaceName(surface: string): Message {
  const isKnown = GROUNDS.some(({ id }) => id === surface)
  if (isKnown) return { key: `checks.ground.${surface}` }
  return { key: 'linePage.drawing.surface', values: { surface } }
}

/** Runs of stations on one surface. */
function surfaceRuns({ stations }: LongSectionInput, frame: LongFrame) {
  const runs: { surface: string; from: number; to: number }[] = []
  for (const { surface, chainage } of stations) {
    const before = runs.at(-1)
    if (before) before.to = chainage
    if (before?.surface !== surface) runs.push({ surface, from: chainage, to: chainage })
  }
  const last = runs.at(-1)
  if (last) last.to = frame.to
  return runs.filter(({ from, to }) => to > from)
}
