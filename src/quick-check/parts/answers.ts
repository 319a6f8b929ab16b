import { seatCheck } from '@shared/checks/seat-check'
import type { Message } from '@shared/texts/format-text'
import { atTemperature } from '@/quick-check/before-water'
import { outcomeOf } from '@/quick-check/hour-notes'
import { runsOver, thrownOver } from './over-crest'
import { quantity, said, type PartId, type PartInput } from './part'

/** The answer of every part in one line. */
export const PART_ANSWERS: Readonly<Record<PartId, (input: PartInput) => Message>> = {
  waves: (input) => {
    const { waveHeight } = input.section.water
    if (waveHeight === 0) return said('sectionDetails.part.waves.none')
    const { wave, total } = input.evaluation.thrust
    return said('sectionDetails.part.waves.some', { force: force(wave), total: force(total) })
  },
  current: ({ section, evaluation }) => {
    if (section.water.currentSpeed === 0) return said('sectionDetails.part.current.none')
    const { current, total } = evaluation.thrust
    return said('sectionDetails.part.current.some', { force: force(current), total: force(total) })
  },
  debris: ({ section, evaluation }) => {
    const { force: whole, draught } = section.debris
    if (whole === 0) return said('sectionDetails.part.debris.none')
    if (section.water.depth < draught)
      return said('sectionDetails.part.debris.aground', { draught: quantity(draught, 'length') })
    return said('sectionDetails.part.debris.some', {
      whole: quantity(whole, 'force'),
      force: force(evaluation.thrust.debris),
    })
  },
  air: airAnswer,
  dry: dryAnswer,
  edge: ({ section, evaluation }) => {
    if (section.barrier.skirtLength === 0) return said('sectionDetails.part.edge.noSkirt')
    const { uplift, waterOnSkirt } = evaluation.vertical
    if (uplift === 0) return said('sectionDetails.part.edge.none')
    return said('sectionDetails.part.edge.some', {
      share: quantity(section.uplift.edgeFactor, 'percent'),
      uplift: force(uplift),
      onSkirt: force(waterOnSkirt),
    })
  },
  bends: ({ values: { turn } }) => {
    if (turn === null || turn === 0) return said('sectionDetails.part.bends.none')
    const values = { turn: quantity(Math.abs(turn), 'angle') }
    return said(
      turn > 0 ? 'sectionDetails.part.bends.away' : 'sectionDetails.part.bends.towards',
      values,
    )
  },
}

function force(value: number) {
  return quantity(value, 'forcePerLength')
}

/** ρ g h: the air pressure that keeps the seat closed [Pa]. */
export function sealPressure({ water, gravity }: PartInput['section']): number {
  return water.density * gravity * water.depth
}

function airAnswer({ section, evaluation, values }: PartInput): Message {
  const seal = sealPressure(section)
  const named = {
    air: quantity(section.barrier.airPressure, 'pressure'),
    seal: quantity(seal, 'pressure', 'up'),
  }
  if (evaluation.verdict !== 'fails' && seatCheck(section)?.givesWay)
    return said('sectionDetails.part.air.seatGone', named)
  if (values.filledAt === null || values.coldest === null)
    return said('sectionDetails.part.air.now', named)
  const cold = atTemperature(section, values.filledAt, values.coldest)
  const outcome = outcomeOf(cold, seal) ?? 'holds'
  const isNews = evaluation.verdict !== 'fails' || outcome === 'limp'
  return said(`sectionDetails.part.air.cold.${isNews ? outcome : 'asNow'}`, {
    ...named,
    cold: quantity(cold.airPressure, 'pressure', 'down'),
  })
}

function dryAnswer(input: PartInput): Message {
  const { dryDepth } = input.section.water
  const over = runsOver(input)
  if (over !== null)
    return said('sectionDetails.part.dry.overflow', { flow: quantity(over, 'overtopping', 'up') })
  const thrown = thrownOver(input)
  const values = {
    depth: quantity(dryDepth, 'length'),
    flow: quantity(thrown?.mean ?? 0, 'overtopping', 'up'),
  }
  if (thrown)
    return said(
      dryDepth > 0 ? 'sectionDetails.part.dry.both' : 'sectionDetails.part.dry.waves',
      values,
    )
  return said(
    dryDepth > 0 ? 'sectionDetails.part.dry.standing' : 'sectionDetails.part.dry.none',
    values,
  )
}
