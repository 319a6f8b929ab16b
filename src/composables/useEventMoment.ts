import { computed, ref, watch } from 'vue'
import {
  crestMoment,
  eventTimes,
  waterAt,
  type WaterAtMoment,
} from '@shared/checks/line-event/event-times'
import { sectionsAt, traceAt } from '@shared/checks/line-event/line-at-moment'
import type { LineEventAnswer } from '@shared/checks/line-event/line-event-answer'
import type { LineEventInput } from '@shared/checks/line-event/line-event-input'

/** Moments that matter, to be gone to at once. */
export type StopId = 'crest' | 'first' | 'leave' | 'now'

export interface ComputedEvent {
  readonly input: LineEventInput
  readonly answer: LineEventAnswer
}

/** Hours that are shown before the water comes and after it has gone [s]. */
const AROUND = 6 * 3600

/** Moments around the time in which water stands at the line; all of them where none ever does. */
function timesAround({ input, answer }: ComputedEvent): readonly WaterAtMoment[] {
  const all = eventTimes(input.water, input.settings.step)
  const ground = Math.min(...answer.sections.map(({ lowest }) => lowest.groundLevel))
  const wet = all.filter(({ high, expected }) => (high ?? expected ?? -Infinity) > ground)
  const [first, last] = [wet[0], wet.at(-1)]
  if (!first || !last) return all
  return all.filter(({ time }) => time >= first.time - AROUND && time <= last.time + AROUND)
}

/** The moment that all drawings of an event show. */
export function useEventMoment(
  event: () => ComputedEvent,
  section: () => number,
  asAt: () => number,
) {
  const times = computed(() => timesAround(event()))
  const index = ref(0)
  const time = computed(() => times.value[Math.min(index.value, times.value.length - 1)]!.time)

  const stops = computed(() => {
    const { input, answer } = event()
    const { first, leave } = answer.bands.expected
    const [from, to] = [times.value[0]!.time, times.value[times.value.length - 1]!.time]
    const all: readonly (readonly [StopId, number | null | undefined])[] = [
      ['now', asAt()],
      ['leave', leave?.time],
      ['first', first?.failure.from],
      ['crest', crestMoment(input.water.expected)?.time],
    ]
    return all.flatMap(([id, at]) =>
      at === null || at === undefined || at < from || at > to ? [] : [{ id, time: at }],
    )
  })

  /** Where it begins: at the first failure, else at the crest. */
  watch(
    times,
    (next, before) => {
      const kept = before?.[index.value]?.time
      const start =
        kept ?? stops.value.find(({ id }) => id === 'first' || id === 'crest')?.time ?? 0
      const found = next.findIndex((moment) => moment.time >= start - 1)
      index.value = found < 0 ? next.length - 1 : found
    },
    { immediate: true },
  )

  const water = computed(() => waterAt(event().input.water, time.value))
  const sections = computed(() => sectionsAt(event().answer, time.value))
  const looked = computed(() => event().answer.sections[section()]!)
  const moment = computed(() => {
    const { shown } = looked.value
    return shown && water.value.expected !== null ? traceAt(shown.trace, time.value) : null
  })
  return { times, index, time, stops, water, sections, looked, moment }
}
