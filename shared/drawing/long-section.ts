import { checksTexts } from '../texts/checks.en'
import { lineTexts } from '../texts/line.en'
import { linePlanTexts } from '../texts/line-plan.en'
import { textResolver, type Message } from '../texts/format-text'
import { groundLevelAt, surfaceAt } from '../calc/line/line-sections'
import { LabelPlacer } from './label-placer'
import { longFrame, type LongFrame } from './long-section/long-frame'
import { labelLongSection } from './long-section/long-labels'
import type { LongSectionInput } from './long-section/long-section-input'
import { labelLongMarks } from './long-section/long-marks'
import { longShapes } from './long-section/long-shapes'
import { windowed } from './long-section/windowed'
import type { Scene } from './scene'
import { measureWith } from './text-width'

export type { LongFrame } from './long-section/long-frame'
export type {
  ChainageWindow,
  DrawnRun,
  DrawnSectionOfLine,
  LongSectionInput,
  WeakestPlace,
} from './long-section/long-section-input'

/** A long section with the axes in which a pointer finds its chainage. */
export interface LongSectionScene extends Scene {
  readonly frame: LongFrame
}

const measureMetric = measureWith(
  textResolver({ linePage: lineTexts, linePlan: linePlanTexts, checks: checksTexts }, 'metric'),
)

/**
 * Long section of a line: ground, tubes by size, loaded crest, water level with its band, the level to
 * which each section holds, low spots, turns, ends, marks, the weakest place and a strip of verdicts.
 * Lengths are to scale; heights are drawn larger by a round factor that the drawing states.
 */
export function longSectionScene(whole: LongSectionInput): LongSectionScene {
  const input = windowed(whole)
  const frame = longFrame(input)
  const placer = new LabelPlacer(input.view, input.measure ?? measureMetric)
  const shapes = longShapes(input, frame)
  labelLongSection(input, frame, placer)
  labelLongMarks(input, frame, placer)
  return {
    width: input.view.width,
    height: input.view.height,
    title: { key: 'linePage.drawing.title' },
    description: describe(whole, frame),
    items: [...shapes, ...placer.placed],
    frame,
  }
}

/** What is known of one chainage of a long section. */
export interface LongSectionReading {
  readonly chainage: number
  readonly groundLevel: number
  readonly surface: string
  /** Water above the ground [m]; null without water. */
  readonly depth: number | null
  readonly diameter: number | null
  readonly holdsToLevel: number | null
  /** Loaded crest of the section [m]; null where no shape stands. */
  readonly crestLevel: number | null
}

/** Reads the figures at a chainage; outside the line those of its nearer end. */
export function readLongSection(input: LongSectionInput, chainage: number): LongSectionReading {
  const { stations, sections, runs, waterLevel } = input
  const groundLevel = groundLevelAt(stations, chainage)
  const isIn = ({ from, to }: { from: number; to: number }) => from <= chainage && chainage <= to
  return {
    chainage,
    groundLevel,
    surface: surfaceAt(stations, chainage),
    depth: waterLevel === null ? null : Math.max(0, waterLevel - groundLevel),
    diameter: runs.filter(isIn).at(-1)?.diameter ?? null,
    holdsToLevel: sections.find(isIn)?.holdsToLevel ?? null,
    crestLevel: sections.find(isIn)?.crestLevel ?? null,
  }
}

function describe(input: LongSectionInput, frame: LongFrame): readonly Message[] {
  const { stations, waterLevel, weakest, sections } = input
  const lowest = stations.reduce((a, b) => (b.groundLevel < a.groundLevel ? b : a))
  const level = (value: number, rounding?: 'down') =>
    ({ value, kind: 'length', ...(rounding ? { rounding } : {}) }) as const
  const messages: Message[] = [
    {
      key: 'linePage.drawing.describe.line',
      values: { from: String(frame.from), to: String(frame.to), count: stations.length },
    },
    {
      key: 'linePage.drawing.describe.lowest',
      values: { level: level(lowest.groundLevel), chainage: String(lowest.chainage) },
    },
  ]
  if (waterLevel !== null) {
    messages.push({ key: 'linePage.drawing.describe.water', values: { level: level(waterLevel) } })
  }
  if (sections.length > 0) {
    const count = (verdict: string) => sections.filter((s) => s.verdict === verdict).length
    messages.push({
      key: 'linePage.drawing.describe.sections',
      values: {
        holds: count('holds'),
        narrow: count('narrow'),
        fails: count('fails'),
        notChecked: count('notChecked'),
      },
    })
  }
  if (weakest && weakest.holdsToLevel !== null) {
    messages.push({
      key: 'linePage.drawing.describe.weakest',
      values: {
        chainage: String(Number(weakest.chainage.toFixed(2))),
        level: level(weakest.holdsToLevel, 'down'),
      },
    })
  }
  return [
    ...messages,
    { key: 'linePage.drawing.exaggeration', values: { times: String(frame.exaggeration) } },
  ]
}
