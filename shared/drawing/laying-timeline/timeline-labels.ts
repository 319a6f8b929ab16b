import type { LabelPlacer } from '../label-placer'
import type { Message } from '../../texts/format-text'
import type { TimelineFrame } from './timeline-frame'
import type { TimelineInput } from './timeline-input'

const verbatim = (text: string): Message => ({ key: 'drawing.verbatim', values: { text } })
const own = (name: string, values: Message['values'] = {}): Message => ({
  key: `deployment.drawing.${name}`,
  values,
})

/** Rows lower than this carry no chainage [px]. */
const NAMED_ROW = 12

/** Names of pairs and sections, the hours, and the worst margin. */
export function labelTimeline(
  input: TimelineInput,
  frame: TimelineFrame,
  placer: LabelPlacer,
): void {
  const size = frame.font
  const { plan } = input
  labelHours(input, frame, placer)
  for (const { number } of plan.pairs) {
    const label = { id: `pair-${number}`, role: 'label', message: own('pair', { number }) } as const
    const y = frame.laneY(number) + size * 0.35
    placer.place({ ...label, size, weight: 600 }, [{ x: frame.left - 8, y, anchor: 'end' }])
  }
  labelMargins(input, frame, placer)
  const heading = { id: 'sections', role: 'labelQuiet', message: own('sections') } as const
  placer.place({ ...heading, size: size - 1 }, [
    { x: frame.left, y: frame.sectionsTop - 7, anchor: 'start' },
  ])
  labelRows(frame, placer)
  labelBars(input, frame, placer)
}

function labelHours({ dayTime }: TimelineInput, frame: TimelineFrame, placer: LabelPlacer): void {
  const size = frame.font - 1
  let day = ''
  for (const tick of frame.ticks) {
    const [weekday = '', ...clock] = dayTime(tick).split(' ')
    const isNew = weekday !== day
    day = weekday
    const text = isNew ? [weekday, ...clock].join(' ') : clock.join(' ')
    const x = frame.toX(tick)
    const y = frame.bottom + size + 6
    placer.place({ id: `hour-${tick}`, role: 'labelQuiet', message: verbatim(text), size }, [
      { x, y, anchor: 'middle' },
      { x: Math.max(x, 4), y, anchor: 'start' },
    ])
  }
}

/** Chainage at which each section begins; where rows are low, of some of them. */
function labelRows({ rows, row, font, left }: TimelineFrame, placer: LabelPlacer): void {
  const every = Math.max(1, Math.ceil(NAMED_ROW / row))
  rows.forEach(({ section, y }, i) => {
    if (i % every !== 0) return
    const chainage = String(Number(section.from.toFixed(2)))
    const label = { id: `row-${section.position}`, role: 'labelQuiet' } as const
    placer.place({ ...label, message: own('chainage', { chainage }), size: font - 1 }, [
      { x: left - 8, y: y + font * 0.33, anchor: 'end' },
    ])
  })
}

/** The chainage on the bar of each section in the lane of its pair, where there is room. */
function labelBars({ plan }: TimelineInput, frame: TimelineFrame, placer: LabelPlacer): void {
  const size = frame.font - 2
  for (const { position, pair, start, finish, from, steps } of plan.sections) {
    const fill = steps.find(({ step }) => step === 'fill')!
    const text = String(Number(from.toFixed(2)))
    const before = frame.toX(fill.from - fill.waited * 1000) - frame.toX(start)
    if (before < size * 0.62 * text.length + 4 || finish === start) continue
    const spot = { x: frame.toX(start) + 3, y: frame.laneY(pair) + size * 0.36, anchor: 'start' }
    placer.place({ id: `bar-${position}`, role: 'labelBarrier', message: verbatim(text), size }, [
      spot as { x: number; y: number; anchor: 'start' },
    ])
  }
}

/** The margin of each section beside its row; the worst stands out. */
function labelMargins({ plan }: TimelineInput, frame: TimelineFrame, placer: LabelPlacer): void {
  const { rows, row, font, right, sectionsTop } = frame
  const worst = plan.worst[plan.judgedBy]?.position
  if (worst === undefined) return
  const x = right + font * 4.6
  const heading = { id: 'margins', role: 'labelQuiet', message: own('margin') } as const
  placer.place({ ...heading, size: font - 1 }, [{ x, y: sectionsTop - 7, anchor: 'end' }])
  const every = Math.max(1, Math.ceil(NAMED_ROW / row))
  const shown = rows.filter(({ section }, i) => i % every === 0 || section.position === worst)
  // The worst first, so that nothing takes its place.
  shown.sort((a, b) => Number(b.section.position === worst) - Number(a.section.position === worst))
  for (const { section, y } of shown) {
    const margin = section.margin[plan.judgedBy]
    if (margin === null) continue
    const isLate = margin < 0
    const isWorst = section.position === worst
    const minutes = Math.max(isLate ? 1 : 0, Math.round(Math.abs(margin) / 60))
    const role = isLate ? 'labelFails' : isWorst ? 'labelHolds' : 'labelQuiet'
    const label = { id: `margin-${section.position}`, role, size: font - 1 } as const
    const message = own(isLate ? 'late' : 'left', { minutes })
    const weight = isWorst || isLate ? 600 : 400
    placer.place({ ...label, message, weight }, [{ x, y: y + font * 0.33, anchor: 'end' }])
  }
}
