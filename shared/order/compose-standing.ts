import type { OrderDocument, OrderWork, RoundBlock, TextBlock } from './order-document'

/** What weighs the line down before the water does, and the edges that are weighed. */
export function ballastOf({ order, words }: OrderWork): TextBlock {
  const { say, speed } = words
  const { ballastBags: bags, ballastInStore: inStore, gust, edgeBags } = order.store
  const isShort = bags !== null && inStore !== null && bags > inStore
  const laid =
    bags === null || gust === null
      ? [say('deploymentOrder.ballast.unknown')]
      : [
          say('deploymentOrder.ballast.laid', { bags, gust: speed(gust) }),
          ...(isShort ? [say('deploymentOrder.ballast.short', { inStore })] : []),
        ]
  const list = edgesOf({ order, words })
  return {
    title: say('deploymentOrder.ballast.title'),
    lines: [
      ...laid,
      ...(edgeBags > 0 ? [say('deploymentOrder.ballast.edge', { bags: edgeBags, list })] : []),
    ],
  }
}

/** Stretches whose edge is weighed, joined where they touch. */
function edgesOf({ order, words }: OrderWork): string {
  const stretches: { from: number; to: number }[] = []
  for (const { from, to, edgeBags } of [...order.sections].sort((a, b) => a.from - b.from)) {
    if (edgeBags === 0) continue
    const before = stretches.at(-1)
    if (before && Math.abs(before.to - from) < 1e-6) before.to = to
    else stretches.push({ from, to })
  }
  const { say, chainage } = words
  return stretches
    .map(({ from, to }) =>
      say('deploymentOrder.ballast.edgeAt', { from: chainage(from), to: chainage(to) }),
    )
    .join(', ')
}

/** When everybody leaves, on the gauge that the crew sees. */
export function leaveOf({ order, words }: OrderWork): TextBlock {
  const { say, level, stage, time } = words
  const { state, level: leave, stage: read, at } = order.leave
  const title = say('deploymentOrder.leave.title')
  const count = say('deploymentOrder.leave.count')
  if (state === 'none' || leave === null)
    return { title, lines: [say('deploymentOrder.leave.none'), count] }
  const shown =
    read === null || !order.gauge
      ? level(leave, 'down')
      : say('deploymentOrder.onGauge', {
          stage: stage(read, 'down'),
          gauge: order.gauge.name,
          level: level(leave, 'down'),
        })
  const isForecast = order.forecast !== null && state !== 'leave-now'
  return {
    title,
    lines: [
      ...(state === 'leave-now' ? [say('deploymentOrder.leave.now')] : []),
      say('deploymentOrder.leave.at', { level: shown }),
      ...(order.gauge ? [] : [say('deploymentOrder.leave.noGauge')]),
      ...(isForecast && at !== null ? [say('deploymentOrder.leave.time', { time: time(at) })] : []),
      ...(isForecast && at === null ? [say('deploymentOrder.leave.never')] : []),
      ...(state === 'leave-before-level' ? [say('deploymentOrder.leave.early')] : []),
      count,
    ],
  }
}

/** Triggers of a round, the ones that clear the line first. */
const TRIGGERS = ['level', 'moved', 'joint', 'skirt', 'air', 'pond', 'ahead', 'debris'] as const

/** What a round looks for, what is then done, and what the gauge should read hour by hour. */
export function roundsOf({ order, words }: OrderWork): RoundBlock {
  const { say, level, stage, time } = words
  const hours = order.forecast?.hours ?? []
  const hasGauge = order.gauge !== null
  const triggers = TRIGGERS.filter((id) => id !== 'ahead' || hours.length > 0)
  return {
    title: say('deploymentOrder.round.title', { minutes: Math.round(order.rounds.every / 60) }),
    lead: say('deploymentOrder.round.lead'),
    when: say('deploymentOrder.round.when'),
    do: say('deploymentOrder.round.do'),
    rows: triggers.map((id) => ({
      when: say(`deploymentOrder.round.${id}.when`),
      do: say(`deploymentOrder.round.${id}.do`),
    })),
    hoursTitle: say(hasGauge ? 'deploymentOrder.round.hours' : 'deploymentOrder.round.hoursLevel'),
    hours: hours.map((hour) => ({
      time: time(hour.at),
      shown: hour.stage === null ? level(hour.level) : stage(hour.stage),
    })),
  }
}

const RETRIEVAL = ['order', 'wait', 'bags', 'air', 'closures', 'plugs', 'back'] as const

/** How the line is taken up again. */
export function retrieveOf({ words }: OrderWork): OrderDocument['retrieve'] {
  return {
    title: words.say('deploymentOrder.retrieve.title'),
    steps: RETRIEVAL.map((id) => words.say(`deploymentOrder.retrieve.${id}`)),
  }
}

const CAUTIONS = ['leave', 'people', 'ground', 'power', 'guarantee', 'codes'] as const

/** The cautions of every verdict, those for the crew first. */
export function cautionsOf({ words }: OrderWork): OrderDocument['cautions'] {
  return {
    title: words.say('deploymentOrder.cautions.title'),
    lines: CAUTIONS.map((id) => words.say(`shell.cautions.${id}`)),
  }
}
