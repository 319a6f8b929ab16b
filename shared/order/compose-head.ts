import type { KeyFact, OrderDocument, OrderWork, TextBlock } from './order-document'

/** Title, issue, and the few facts that everybody must know. */
export function headOf({ order, words }: OrderWork) {
  const { say, time } = words
  const { number, line, project, organisation, issuedAt, expiresAt } = order
  return {
    title: say('order.title', { number }),
    windowTitle: say('order.windowTitle', { number, line }),
    place: say('order.place', { line, project: project.name }),
    site: project.site,
    issue: [
      say('order.issuedBy', { organisation }),
      say('order.issued', { time: time(issuedAt) }),
      say('order.expires', { time: time(expiresAt) }),
    ],
    source: say('order.madeFrom', {
      scenario: order.scenario,
      datum: order.datum,
      timeZone: order.timeZone,
    }),
    note: order.note,
  }
}

/** The facts that stand large: where, whom to call, by when, until when. */
export function keysOf(work: OrderWork): readonly KeyFact[] {
  const { order, words } = work
  const { say } = words
  const meet = fact('meet', say('order.key.meet'), order.meetAt)
  const call = order.contact === '' ? [] : [fact('call', say('order.key.call'), order.contact)]
  return [meet, ...call, startOf(work), leaveOf(work), ...waterOf(work)]
}

function fact(id: KeyFact['id'], label: string, value: string, more = ''): KeyFact {
  return { id, label, value, more }
}

/** The latest start with the margin that is wanted; the planned one where that is later already. */
function startOf({ order, words }: OrderWork): KeyFact {
  const { say, time, minutes } = words
  const { startBy, onSite, wantedMargin } = order.times
  const label = say('order.key.start')
  if (onSite === null) return fact('start', label, say('order.key.startNone'))
  if (startBy === null) return fact('start', label, time(onSite))
  if (onSite <= startBy) {
    return fact('start', label, time(startBy), say('order.times.onSite', { time: time(onSite) }))
  }
  const wanted = { margin: minutes(wantedMargin ?? 0), time: time(startBy) }
  return fact('start', label, time(onSite), say('order.key.startWanted', wanted))
}

function leaveOf({ order, words }: OrderWork): KeyFact {
  const { say, level, stage } = words
  const { state, level: leave, stage: read, at } = order.leave
  const label = say('order.key.leave')
  if (state === 'none' || leave === null) return fact('leave', label, say('order.key.leaveNone'))
  if (state === 'leave-now') return fact('leave', label, say('order.key.leaveNow'))
  const until = at === null ? '' : say('order.leave.time', { time: words.time(at) })
  if (read === null || !order.gauge) return fact('leave', label, level(leave, 'down'), until)
  const value = say('order.stage', { stage: stage(read, 'down'), gauge: order.gauge.name })
  return fact('leave', label, value, [level(leave, 'down'), until].filter(Boolean).join(' · '))
}

function waterOf({ order, words }: OrderWork): readonly KeyFact[] {
  if (order.times.layingFrom === null) return []
  const { firstWater } = order.times
  const { say, time } = words
  const value = firstWater === null ? say('order.key.waterNone') : time(firstWater)
  return [fact('water', say('order.key.water'), value)]
}

/** A level as the crew reads it where it can, else in the datum. */
export function asRead(
  { order, words }: OrderWork,
  { level, stage }: { readonly level: number; readonly stage: number | null },
): string {
  if (stage === null || !order.gauge) return words.level(level)
  const values = { stage: words.stage(stage), gauge: order.gauge.name, level: words.level(level) }
  return words.say('order.onGauge', values)
}

/** Verdict, and the answer before its reason. */
export function verdictOf({ order, words }: OrderWork): OrderDocument['verdict'] {
  const { say, level, chainage } = words
  const { verdict: id, holdsTo, waterLevel } = order
  const place = chainage(order.weakestAt)
  const holds = holdsTo
    ? say('order.answer.holds', { level: level(holdsTo.level, 'down'), place })
    : say('order.answer.none', { place })
  const fails =
    id === 'fails' && holdsTo ? [say('order.answer.fails', { water: level(waterLevel.level) })] : []
  return { id, word: say(`checks.verdict.${id}`), answers: [holds, ...fails] }
}

/** The forecast issue, its crest and its band; or that there is none. */
export function forecastOf(work: OrderWork): TextBlock {
  const { order, words } = work
  const { say, level, time } = words
  const { forecast, waterLevel } = order
  const title = say('order.forecast.title')
  const checked = say('order.forecast.checked', { level: asRead(work, waterLevel) })
  if (!forecast) {
    return { title, lines: [say('order.forecast.none', { level: asRead(work, waterLevel) })] }
  }
  const { crest, crestAt, low, high } = forecast
  const issue = { gauge: forecast.gauge, time: time(forecast.issuedAt) }
  return {
    title,
    lines: [
      say('order.forecast.issue', issue),
      ...(forecast.isSketch ? [say('order.forecast.sketch')] : []),
      ...(crest === null || crestAt === null
        ? []
        : [say('order.forecast.crest', { level: level(crest), time: time(crestAt) })]),
      ...(low === null || high === null
        ? []
        : [say('order.forecast.band', { low: level(low), high: level(high) })]),
      say(`order.forecast.bandName.${forecast.band}`),
      checked,
    ],
  }
}

/** The times of the plan, and the least time to spare. */
export function timesOf({ order, words }: OrderWork): TextBlock {
  const { say, time, minutes, chainage } = words
  const { decideBy, onSite, layingFrom, finish, firstWater, worstMargin, worstAt } = order.times
  const at = (key: string, moment: number | null) =>
    moment === null ? [] : [say(key, { time: time(moment) })]
  const margin = (): readonly string[] => {
    if (worstMargin === null || worstAt === null) return []
    const values = { margin: minutes(Math.abs(worstMargin)), place: chainage(worstAt) }
    return [say(worstMargin < 0 ? 'order.times.late' : 'order.times.margin', values)]
  }
  return {
    title: say('order.times.title'),
    lines: [
      ...at('order.times.decide', decideBy),
      ...at('order.times.onSite', onSite),
      ...at('order.times.laying', layingFrom),
      ...at('order.times.finish', finish),
      ...at('order.times.water', firstWater),
      ...margin(),
    ],
  }
}
