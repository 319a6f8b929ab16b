import type { Chart, ChartOptions, Plugin } from 'chart.js'

/** Colours by meaning, as the style sheet has them. */
export interface ChartColours {
  readonly ink: string
  readonly muted: string
  readonly line: string
  readonly water: string
  readonly waterWash: string
  readonly barrier: string
  readonly dry: string
  readonly ground: string
  readonly holds: string
  readonly narrow: string
  readonly fails: string
}

/** Colours of the page now; a canvas knows no style sheet, so another theme reads them again. */
export function chartColours(_isDark: boolean): ChartColours {
  const style = getComputedStyle(document.documentElement)
  const read = (name: string): string => style.getPropertyValue(`--${name}`).trim()
  const water = read('water')
  return {
    ...{ ink: read('ink'), muted: read('muted'), line: read('line') },
    ...{ water, waterWash: `${water}2e` },
    ...{ barrier: read('barrier'), dry: read('dry'), ground: read('ground') },
    ...{ holds: read('holds'), narrow: read('narrow'), fails: read('fails') },
  }
}

export interface ChartWords {
  readonly colours: ChartColours
  readonly title: string
  /** A moment in words [s]. */
  readonly at: (time: number) => string
  readonly show: (value: number) => string
  /** A figure without its unit. */
  readonly short: (value: number) => string
  /** First and last moment [s]. */
  readonly span: readonly [number, number]
  /** Somebody pointed at a moment [s]. */
  readonly pick: (time: number) => void
}

const HOUR = 3600

/** Hours between two ticks, so that there are at most eight. */
function tickStep(span: number): number {
  const steps = [1, 2, 3, 6, 12, 24, 48, 96, 168]
  return (steps.find((hours) => span / (hours * HOUR) <= 6) ?? 336) * HOUR
}

const FONT = { family: 'IBM Plex Sans, system-ui, sans-serif', size: 11 }

/** Look and words of one chart. */
export function chartOptions(words: ChartWords): ChartOptions<'line'> {
  const { colours, at, show, pick } = words
  return {
    responsive: true,
    maintainAspectRatio: false,
    animation: false,
    parsing: false,
    interaction: { mode: 'nearest', axis: 'x', intersect: false },
    onClick: (event, _active, chart) => {
      const time = chart.scales.x?.getValueForPixel(event.x ?? 0)
      if (time !== undefined) pick(time)
    },
    scales: { x: timeAxis(words), y: figureAxis(words) },
    plugins: {
      legend: {
        position: 'bottom',
        labels: { color: colours.ink, font: FONT, boxWidth: 18, boxHeight: 1 },
      },
      tooltip: {
        callbacks: {
          title: ([item]) => (item ? at(item.parsed.x ?? 0) : ''),
          label: ({ dataset, parsed }) => `${dataset.label ?? ''}: ${show(parsed.y ?? 0)}`,
        },
      },
    },
  }
}

type Axis = NonNullable<NonNullable<ChartOptions<'line'>['scales']>[string]>

function timeAxis({ colours, at, span: [min, max] }: ChartWords): Axis {
  const step = tickStep(max - min)
  const first = Math.ceil(min / step) * step
  const count = Math.floor((max - first) / step) + 1
  const ticks = Array.from({ length: count }, (_, i) => ({ value: first + i * step }))
  return {
    type: 'linear',
    ...{ min, max },
    grid: { color: colours.line },
    ticks: {
      ...{ color: colours.muted, font: FONT, maxRotation: 0, autoSkip: true },
      callback: (value) => at(Number(value)),
    },
    afterBuildTicks: (axis) => {
      axis.ticks = ticks
    },
  }
}

function figureAxis({ colours, short, title }: ChartWords): Axis {
  return {
    type: 'linear',
    grid: { color: colours.line },
    ticks: {
      ...{ color: colours.muted, font: FONT, maxTicksLimit: 7 },
      callback: (value) => short(Number(value)),
    },
    title: { display: true, text: title, color: colours.muted, font: FONT },
  }
}

/** The dashed line of the moment that is looked at. */
export function momentLine(read: () => { time: number; colour: string }): Plugin<'line'> {
  return {
    id: 'moment-line',
    afterDatasetsDraw(chart: Chart) {
      const { time, colour } = read()
      const { x } = chart.scales
      if (!x || time < x.min || time > x.max) return
      const { ctx, chartArea } = chart
      const at = x.getPixelForValue(time)
      ctx.save()
      ctx.strokeStyle = colour
      ctx.lineWidth = 1.5
      ctx.setLineDash([5, 4])
      ctx.beginPath()
      ctx.moveTo(at, chartArea.top)
      ctx.lineTo(at, chartArea.bottom)
      ctx.stroke()
      ctx.restore()
    },
  }
}
