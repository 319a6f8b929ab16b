import type { ChartData, ChartDataset } from 'chart.js'
import { HIGHEST_FACTOR, pointsOf, type ChartRow } from './chart-series'
import type { ChartColours } from './chart-look'

type Data = ChartData<'line', { x: number; y: number | null }[]>
type Dataset = ChartDataset<'line', { x: number; y: number | null }[]>

/** What every chart is drawn from. */
export interface ChartLook {
  readonly rows: readonly ChartRow[]
  readonly colours: ChartColours
  readonly word: (key: string) => string
}

const PLAIN = { pointRadius: 0, pointHitRadius: 8, borderWidth: 2, spanGaps: false } as const
const DASHED = { ...PLAIN, borderWidth: 1.5, borderDash: [6, 4] }

/** Water with its band, and the levels that it is compared with. */
export function levelData(
  { rows, colours, word }: ChartLook,
  levels: {
    readonly ground: number
    readonly holdsTo: number | null
    readonly leave: number | null
  },
): Data {
  const { water, waterWash, ground, holds, narrow } = colours
  return {
    datasets: [
      {
        ...PLAIN,
        ...{ label: word('high'), borderColor: water, borderWidth: 1, backgroundColor: waterWash },
        ...{ fill: 1, data: pointsOf(rows, (row) => row.high) },
      },
      {
        ...PLAIN,
        ...{ label: word('low'), borderColor: water, borderWidth: 1, borderDash: [2, 2] },
        data: pointsOf(rows, (row) => row.low),
      },
      {
        ...PLAIN,
        ...{ label: word('expected'), borderColor: water, borderWidth: 2.5 },
        data: pointsOf(rows, (row) => row.expected),
      },
      ...levelLine(rows, { label: word('holdsTo'), level: levels.holdsTo, colour: holds }),
      ...levelLine(rows, { label: word('leave'), level: levels.leave, colour: narrow }),
      ...levelLine(rows, { label: word('ground'), level: levels.ground, colour: ground }),
    ],
  }
}

/** Factors of sliding and of the skirt, and what is required. */
export function factorData({ rows, colours, word }: ChartLook, required: number | null): Data {
  return {
    datasets: [
      {
        ...PLAIN,
        ...{ label: word('sliding'), borderColor: colours.barrier },
        data: pointsOf(rows, (row) => row.sliding, HIGHEST_FACTOR),
      },
      {
        ...PLAIN,
        ...{ label: word('skirt'), borderColor: colours.dry },
        data: pointsOf(rows, (row) => row.skirt, HIGHEST_FACTOR),
      },
      ...levelLine(rows, { label: word('required'), level: required, colour: colours.fails }),
    ],
  }
}

/** Freeboard, and what is required. */
export function freeboardData({ rows, colours, word }: ChartLook, required: number): Data {
  return {
    datasets: [
      {
        ...PLAIN,
        ...{ label: word('available'), borderColor: colours.barrier },
        data: pointsOf(rows, (row) => row.freeboard),
      },
      ...levelLine(rows, { label: word('required'), level: required, colour: colours.fails }),
    ],
  }
}

function levelLine(
  rows: readonly ChartRow[],
  { label, level, colour }: { label: string; level: number | null; colour: string },
): Dataset[] {
  if (level === null || rows.length === 0) return []
  const [first, last] = [rows[0]!.time, rows[rows.length - 1]!.time]
  const data = [first, last].map((x) => ({ x, y: level }))
  return [{ ...DASHED, label, borderColor: colour, data }]
}
