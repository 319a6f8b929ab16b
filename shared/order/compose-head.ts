import type { KeyFact, OrderDocument, OrderWork, TextBlock } from './order-document'

/** Title, issue, and the few facts that everybody must know. */
export function headOf({ order, words }: OrderWork) {
  const { say, time } = words
  const { number, line, project, organisation, issuedAt, expiresAt } = order
  return {
    title: say('deploymentOrder.title', { number }),
    windowTitle: say('deploymentOrder.windowTitle', { number, line }),
    place: say('deploymentOrder.place', { line, project: project.name }),
    site: project.site,
    issue: [
      say('deploymentOrder.issuedBy', { organisation }),
      say('deploymentOrder.issued', { time: time(issuedAt) }),
      say('deploymentOrder.expires', { time: time(expiresAt) }),
    ],
    source: say('deploymentOrder.madeFrom', {
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
  const meet = fact('meet', say('deploymentOrder.key.meet'), order.meetAt)
  const call =
    order.contact === '' ? [] : [fact('call', say('deploymentOrder.key.call'), order.contact)]
  return [meet, ...call, startOf(work), leaveOf(work), ...waterOf(work)]
}

function fact(id: KeyFact['id'], label: string, value: string, more = ''): KeyFact {
  return { id, label, value, more }
}

/** The latest start with the margin that is wanted; the planned one where that is later already. */
function startOf({ order, words }: OrderWork): KeyFact {
  const { say, time, minutes } = words
  const { startBy, onSite, wantedMargin } = order.times
  const label = say('deploymentOrder.key.start')
  if (onSite === null) return fact('start', label, say('deploymentOrder.key.startNone'))
  if (startBy === null) return fact('start', label, time(onSite))
  if (onSite <= startBy) {
    return fact(
      'start',
      label,
      time(startBy),
      say('deploymentOrder.times.onSite', { time: time(onSite) }),
    )
  }
  const wanted = { margin: minutes(wantedMargin ?? 0), time: time(startBy) }
  return fact('start', label, time(onSite), say('deploymentOrder.key.startWanted', wanted))
}

function leaveOf({ order, words }: OrderWork): KeyFact {
  const { say, level, stage } = words
  const { state, level: leave, stage: read, at } = order.leave
  const label = say('deploymentOrder.key.leave')
  if (state === 'none' || leave === null)
    return fact('leave', label, say('deploymentOrder.key.leaveNone'))
  if (state === 'leave-now') return fact('leave', label, say('deploymentOrder.key.leaveNow'))
  const until = at === null ? '' : say('deploymentOrder.leave.time', { time: words.time(at) })
  if (read === null || !order.gauge) return fact('leave', label, level(leave, 'down'), until)
  const value = say('deploymentOrder.stage', {
    stage: stage(read, 'down'),
    gauge: order.gauge.name,
  })
  return fact('leave', label, value, [level(leave, 'down'), until].filter(Boolean).join(' · '))
}

function waterOf({ order, words }: OrderWork): readonly KeyFact[] {
  if (order.times.layingFrom === null) return []
  const { firstWater } = order.times
  const { say, time } = words
  const value = firstWater === null ? say('deploymentOrder.key.waterNone') : time(firstWater)
  return [fact('water', say('deploymentOrder.key.water'), value)]
}

/** A level as the crew reads it where it can, else in the datum. */
export function asRead(
  { order, words }: OrderWork,
  { level, stage }: { readonly level: number; readonly stage: number | null },
): string {
  if (stage === null || !order.gauge) return words.level(level)
  const values = { stage: words.stage(stage), gauge: order.gauge.name, level: words.level(level) }
  return words.say('deploymentOrder.onGauge', values)
}

/** Verdict, and the answer before its reason. */
export function verdictOf({ order, words }: OrderWork): OrderDocument['verdict'] {
  const { say, level, chainage } = words
  const { verdict: id, holdsTo, waterLevel } = order
  const place = chainage(order.weakestAt)
  const holds = holdsTo
    ? say('deploymentOrder.answer.holds', { level: level(holdsTo.level, 'down'), place })
    : say('deploymentOrder.answer.none', { place })
  const fails =
    id === 'fails' && holdsTo
      ? [say('deploymentOrder.answer.fails', { water: level(waterLevel.level) })]
      : []
  return { id, word: say(`checks.verdict.${id}`), answers: [holds, ...fails] }
}

/** The forecast issue, its crest and its band; or that there is none. */
export function forecastOf(work: OrderWork): TextBlock {
  const { order, words } = work
  const { say, level, time } = words
  const { forecast, waterLevel } = order
  const title = say('deploymentOrder.forecast.title')
  const checked = say('deploymentOrder.forecast.checked', { level: asRead(work, waterLevel) })
  if (!forecast) {
    return {
      title,
      lines: [say('deploymentOrder.forecast.none', { level: asRead(work, waterLevel) })],
    }
  }
  const { crest, crestAt, low, high } = forecast
  const issue = { gauge: forecast.gauge, time: time(forecast.issuedAt) }
  return {
    title,
    lines: [
      say('deploymentOrder.forecast.issue', issue),
      ...(forecast.isSketch ? [say('deploymentOrder.forecast.sketch')] : []),
      ...(crest === null || crestAt === null
        ? []
        : [say('deploymentOrder.forecast.crest', { level: level(crest), time: time(crestAt) })]),
      ...(low === null || high === null
        ? []
        : [say('deploymentOrder.forecast.band', { low: level(low), high: level(high) })]),
      say(`deploymentOrder.forecast.bandName.${forecast.band}`),
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
    return [
      say(worstMargin < 0 ? 'deploymentOrder.times.late' : 'deploymentOrder.times.margin', values),
    ]
  }
  return {
    title: say('deploymentOrder.times.title'),
    lines: [
      ...at('deploymentOrder.times.decide', decideBy),
      ...at('deploymentOrder.times.onSite', onSite),
      ...at('deploymentOrder.times.laying', layingFrom),
      ...at('deploymentOrder.times.finish', finish),
      ...at('deploymentOrder.times.water', firstWater),
      ...margin(),
    ],
  }
}
