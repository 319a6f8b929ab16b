import { computed } from 'vue'
import { crestMoment } from '@shared/checks/line-event/event-times'
import type { LineEventAnswer, LineOutcome } from '@shared/checks/line-event/line-event-answer'
import { EVENT_BANDS, type LineEventInput } from '@shared/checks/line-event/line-event-input'
import { useEventWords } from './useEventWords'

/** What the words of a verdict rest on. */
export interface VerdictParts {
  readonly input: LineEventInput
  readonly answer: LineEventAnswer
  /** Moment that counts as now [s]. */
  readonly asAt: number
}

/** The answer of an event in sentences: does it hold, and when does everybody leave. */
export function useEventVerdict(parts: () => VerdictParts, timeZone: () => string) {
  const words = useEventWords(timeZone)
  const { t, at } = words
  const placeOf = (section: number): string =>
    words.figure(parts().answer.sections[section]!.lowest.place)
  const saying = { ...words, placeOf }

  const gaps = computed(() =>
    parts().answer.gaps.map(({ from, to }) =>
      t('eventPage.verdict.gap', { from: at(from), to: at(to) }),
    ),
  )
  return {
    headline: computed(() => headlineWords(parts(), saying)),
    leave: computed(() => leaveWords(parts(), saying)),
    rows: computed(() => bandRows(parts(), saying)),
    gaps,
  }
}

type Saying = ReturnType<typeof useEventWords> & { readonly placeOf: (section: number) => string }

function headlineWords({ answer, input }: VerdictParts, saying: Saying): string {
  const { t, at, level, check, placeOf } = saying
  const { verdict, first, notChecked } = answer.bands.expected
  if (verdict === 'notChecked') return t('eventPage.verdict.notChecked', { count: notChecked })
  if (verdict === 'fails') {
    if (!first) return t('eventPage.verdict.failsDry')
    return t('eventPage.verdict.fails', {
      place: placeOf(first.section),
      time: at(first.failure.from),
      level: level(first.failure.level),
      check: check(first.failure.check),
    })
  }
  const crest = crestMoment(input.water.expected)!
  const values = { level: level(crest.level), time: at(crest.time) }
  return t(`eventPage.verdict.${verdict}`, values)
}

function leaveWords({ answer, input, asAt }: VerdictParts, saying: Saying) {
  const { t, q, at, down, placeOf } = saying
  const of = answer.bands.expected.leave
  if (!of) return { words: '', why: '' }
  const place = placeOf(of.section)
  if (of.level === null) return { words: t('eventPage.verdict.leave.none', { place }), why: '' }
  const why = t('eventPage.verdict.leave.why', {
    margin: q(of.margin, 'length'),
    minutes: q(input.settings.timeToClear, 'minutes'),
  })
  const { expected } = input.water
  const end = expected[expected.length - 1]!.time
  const values = { level: down(of.level), place }
  if (of.time === null) return { words: t('eventPage.verdict.leave.later', values), why }
  const key = of.time <= asAt && asAt <= end ? 'now' : 'at'
  return { words: t(`eventPage.verdict.leave.${key}`, { ...values, time: at(of.time) }), why }
}

function bandRows({ answer }: VerdictParts, { t, at, placeOf }: Saying) {
  const atPlace = (time: number, section: number): string =>
    t('eventPage.verdict.bands.atPlace', { time: at(time), place: placeOf(section) })
  const leaving = (of: LineOutcome['leave']): string => {
    if (!of || of.level === null) return t('eventPage.sections.none')
    if (of.time === null) return t('eventPage.verdict.bands.neverLeft')
    return atPlace(of.time, of.section)
  }
  return EVENT_BANDS.map((band) => {
    const { verdict, first, leave } = answer.bands[band]
    return {
      ...{ band, verdict },
      first: first
        ? atPlace(first.failure.from, first.section)
        : t('eventPage.verdict.bands.never'),
      leave: leaving(leave),
    }
  })
}
