import {
  compressorDuty,
  leakCoefficient,
  leakedPressure,
  timeToPressure,
  type LinkedAir,
} from '@shared/calc/air/linked-air'
import { breachFlow } from '@shared/calc/moving-water/breach-flow'
import { seatCheck, type SeatCheck } from '@shared/checks/seat-check'
import { leastAirPressure } from '@/quick-check/before-water'
import { figure, said, type PartGroup, type PartInput, type PartRow } from './part'

/** Air: what the seat bears, sections on one air with a leak, and a tube that is lost. */
export function airPart(input: PartInput): readonly PartGroup[] {
  return [seatGroup(input), linkedGroup(input), punctureGroup(input)]
}

function seatGroup({ section }: PartInput): PartGroup {
  const least = leastAirPressure(section)?.least ?? null
  const seat = seatCheck(section)
  const rows: PartRow[] = []
  if (least !== null) {
    const isWarning = section.barrier.airPressure < least
    rows.push({
      name: said('sectionDetails.part.air.least'),
      value: figure(least, 'pressure', 'up'),
      isWarning,
    })
  }
  if (!seat) return { title: null, fields: [], rows, notes: [] }
  const note = seat.givesWay ? 'seatLost' : 'seatNote'
  return {
    title: null,
    fields: [],
    rows: [...rows, ...seatRows(seat)],
    notes: [said(`sectionDetails.part.air.${note}`)],
  }
}

function seatRows({ limit, limitWithWeight, atPeel, givesWay }: SeatCheck): readonly PartRow[] {
  const bears = (pressure: number | null): PartRow['value'] =>
    pressure === null
      ? said('sectionDetails.part.air.seatAny')
      : figure(pressure, 'pressure', 'down')
  return [
    { name: said('sectionDetails.part.air.seat'), value: bears(limit) },
    { name: said('sectionDetails.part.air.seatWeighed'), value: bears(limitWithWeight) },
    {
      name: said('sectionDetails.part.air.there'),
      value: figure(atPeel, 'pressure', 'up'),
      isWarning: givesWay,
    },
  ]
}

function linkedGroup(input: PartInput): PartGroup {
  const title = said('sectionDetails.part.air.linked')
  const fields = ['linkedSections', 'dropFrom', 'dropTo', 'dropTime', 'nightTime'] as const
  const air = linkedAir(input)
  const duty = ['compressorFlow', 'startPressure', 'stopPressure'] as const
  return {
    title,
    fields: [...fields, ...duty],
    rows: air === null ? [] : [...leakRows(input, air), ...compressorRows(input, air)],
    notes: [
      ...(doesRise(input) ? [said('sectionDetails.part.air.rises')] : []),
      said('sectionDetails.part.air.linkedNote'),
    ],
  }
}

/** Volume of air in the sections that are joined [m³]. */
function volumeOf({ section, values }: PartInput): number {
  const { diameter, sectionLength } = section.barrier
  return ((Math.PI * diameter ** 2) / 4) * sectionLength * (values.linkedSections ?? 1)
}

function doesRise({ values: { dropFrom, dropTo } }: PartInput): boolean {
  return dropFrom !== null && dropTo !== null && dropTo > dropFrom
}

/** The joined air with the leak that was measured on it; null until a drop is entered. */
function linkedAir(input: PartInput): LinkedAir | null {
  const { dropFrom: from, dropTo: to, dropTime: duration } = input.values
  if (from === null || to === null || duration === null || to > from) return null
  const volume = volumeOf(input)
  return { volume, leak: leakCoefficient({ volume, from, to, duration }) }
}

function leakRows(input: PartInput, air: LinkedAir): readonly PartRow[] {
  const { section, values } = input
  const { airPressure } = section.barrier
  const least = leastAirPressure(section)?.least ?? null
  const after = leakedPressure(air, airPressure, values.nightTime ?? 0)
  const time = least === null ? null : timeToPressure(air, airPressure, least)
  return [
    { name: said('sectionDetails.part.air.volume'), value: figure(air.volume, 'volume') },
    {
      name: said('sectionDetails.part.air.after'),
      value: figure(after, 'pressure', 'down'),
      isWarning: least !== null && after < least,
    },
    ...(time === null
      ? []
      : [
          {
            name: said('sectionDetails.part.air.until'),
            value: Number.isFinite(time)
              ? figure(time, 'hours', 'down')
              : said('sectionDetails.part.air.never'),
            isWarning: time < (values.nightTime ?? 0),
          },
        ]),
  ]
}

function compressorRows({ values }: PartInput, air: LinkedAir): readonly PartRow[] {
  const { compressorFlow: flow, startPressure, stopPressure } = values
  if (flow === null || startPressure === null || stopPressure === null) return []
  if (startPressure >= stopPressure)
    return [
      {
        name: said('sectionDetails.part.air.compressor'),
        value: said('sectionDetails.part.air.stopsFirst'),
        isWarning: true,
      },
    ]
  const { share, leastFlow } = compressorDuty(air, { flow, startPressure, stopPressure })
  return [
    {
      name: said('sectionDetails.part.air.compressor'),
      value:
        share === null ? said('sectionDetails.part.air.tooSmall') : figure(share, 'percent', 'up'),
      isWarning: share === null,
    },
    { name: said('sectionDetails.part.air.leastFlow'), value: figure(leastFlow, 'flow', 'up') },
  ]
}

function punctureGroup({ section, values }: PartInput): PartGroup {
  const { depth } = section.water
  const { steady, firstRush } = breachFlow(depth, section.barrier.sectionLength, section.gravity)
  const isLinked = (values.linkedSections ?? 1) > 1
  return {
    title: said('sectionDetails.part.air.puncture'),
    fields: [],
    rows:
      depth === 0
        ? []
        : [
            {
              name: said('sectionDetails.part.air.rush'),
              value: figure(firstRush, 'largeFlow', 'up'),
            },
            {
              name: said('sectionDetails.part.air.through'),
              value: figure(steady, 'largeFlow', 'up'),
            },
          ],
    notes: [said(isLinked ? 'sectionDetails.part.air.allLost' : 'sectionDetails.part.air.oneLost')],
  }
}
