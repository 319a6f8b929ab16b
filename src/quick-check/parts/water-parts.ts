import { debrisImpact } from '@shared/calc/moving-water/debris-impact'
import { waveGrowth } from '@shared/calc/moving-water/wave-growth'
import type { Message } from '@shared/texts/format-text'
import { pondLimit } from '@shared/checks/pond-limit'
import { runsOver, thrownOver } from './over-crest'
import {
  figure,
  quantity,
  said,
  type PartGroup,
  type PartInput,
  type PartProposal,
  type PartRow,
} from './part'

const row = (name: string, value: Message, isWarning = false): PartRow => ({
  name: said(name),
  value,
  isWarning,
})

/** Waves: what they do here, and how wind raises them. */
export function wavesPart(input: PartInput): readonly PartGroup[] {
  return [wavesNow(input), wavesGrown(input)]
}

function wavesNow(input: PartInput): PartGroup {
  const { section, evaluation } = input
  const { waveHeight, depth } = section.water
  const thrown = thrownOver(input)
  const isActing = waveHeight > 0
  const rows = isActing
    ? [
        row(
          'sectionDetails.part.waves.thrust',
          figure(evaluation.thrust.wave, 'forcePerLength', 'up'),
        ),
        row(
          'sectionDetails.part.waves.freeboard',
          figure(Math.min(waveHeight, 0.78 * depth), 'smallLength', 'up'),
        ),
        ...(thrown
          ? [row('sectionDetails.part.waves.over', figure(thrown.mean, 'overtopping', 'up'))]
          : []),
      ]
    : []
  const notes = [
    said('sectionDetails.part.waves.where'),
    ...(isActing && waveHeight > 0.35 * depth ? [said('sectionDetails.part.waves.breaking')] : []),
  ]
  const entered = { field: 'waveHeight', label: said('sectionDetails.part.enter.waves') } as const
  return { title: null, fields: [], rows, entered, notes }
}

function wavesGrown({ section, values }: PartInput): PartGroup {
  const { windSpeed, fetch, fetchDepth } = values
  const notes = [said('sectionDetails.part.waves.source'), said('sectionDetails.part.waves.spread')]
  const group = {
    title: said('sectionDetails.part.waves.growth'),
    fields: ['windSpeed', 'fetch', 'fetchDepth'],
  } as const
  if (windSpeed === null || fetch === null || fetchDepth === null)
    return { ...group, rows: [], notes }
  const grown = waveGrowth({ windSpeed, fetch, depth: fetchDepth, gravity: section.gravity })
  const height = Number(grown.height.toFixed(3))
  const period = Number(grown.period.toFixed(2))
  const named = { height: quantity(height, 'length'), period: quantity(period, 'seconds') }
  return {
    ...group,
    rows: [
      row('sectionDetails.part.waves.height', figure(height, 'length')),
      row('sectionDetails.part.waves.period', figure(period, 'seconds')),
    ],
    proposal: {
      label: said('sectionDetails.part.waves.put', named),
      values: { waveHeight: height, wavePeriod: period },
    },
    notes,
  }
}

/** The current that presses; what it does along the line is told with the edge. */
export function currentPart({ section, evaluation }: PartInput): readonly PartGroup[] {
  const { currentSpeed } = section.water
  const head = currentSpeed ** 2 / (2 * section.gravity)
  const rows =
    currentSpeed === 0
      ? []
      : [
          row(
            'sectionDetails.part.current.thrust',
            figure(evaluation.thrust.current, 'forcePerLength', 'up'),
          ),
          row('sectionDetails.part.current.head', figure(head, 'smallLength', 'up')),
        ]
  return [
    {
      title: null,
      fields: [],
      rows,
      entered: { field: 'currentSpeed', label: said('sectionDetails.part.enter.current') },
      notes: [said('sectionDetails.part.current.where'), said('sectionDetails.part.current.drag')],
    },
  ]
}

/** Floating debris: what it does, and a force from mass, speed and stopping time. */
export function debrisPart({ section, evaluation, values }: PartInput): readonly PartGroup[] {
  const rows =
    section.debris.force === 0
      ? []
      : [
          row(
            'sectionDetails.part.debris.thrust',
            figure(evaluation.thrust.debris, 'forcePerLength', 'up'),
          ),
        ]
  const { debrisMass: mass, debrisSpeed: speed, debrisStop: stoppingTime } = values
  const isGiven = mass !== null && speed !== null && stoppingTime !== null
  const impact = isGiven ? debrisImpact({ mass, speed, stoppingTime }) : null
  return [
    {
      title: null,
      fields: [],
      rows,
      entered: { field: 'debrisForce', label: said('sectionDetails.part.enter.debris') },
      notes: [said('sectionDetails.part.debris.where'), said('sectionDetails.part.debris.spread')],
    },
    {
      title: said('sectionDetails.part.debris.impact'),
      fields: ['debrisMass', 'debrisSpeed', 'debrisStop'],
      rows: impact
        ? [
            row('sectionDetails.part.debris.mean', figure(impact.mean, 'force', 'up')),
            row('sectionDetails.part.debris.peak', figure(impact.peak, 'force', 'up')),
          ]
        : [],
      proposal: impact && putForce(impact.peak),
      notes: [said('sectionDetails.part.debris.source')],
    },
  ]
}

function putForce(peak: number): PartProposal {
  const force = Math.ceil(peak)
  return {
    label: said('sectionDetails.part.debris.put', { force: quantity(force, 'force', 'up') }),
    values: { debrisForce: force },
  }
}

/** Trained people may stand in so much, aware people in so much [m²/s]. EurOtop 2007, table 3.2 (from memory). */
const AWARE = 0.1e-3
const TRAINED = 10e-3

/** What comes over the crest, and how deep the dry side may stand. */
export function dryPart(input: PartInput): readonly PartGroup[] {
  return [overPart(input), pondPart(input)]
}

function overPart(input: PartInput): PartGroup {
  const length = input.section.barrier.sectionLength
  const running = runsOver(input)
  const thrown = thrownOver(input)
  const title = said('sectionDetails.part.dry.over')
  if (running !== null) {
    return {
      title,
      fields: [],
      rows: [
        row('sectionDetails.part.dry.runsOver', figure(running, 'overtopping', 'up'), true),
        row(
          'sectionDetails.part.dry.perSection',
          figure(running * length, 'largeFlow', 'up'),
          true,
        ),
      ],
      notes: [said('sectionDetails.part.dry.weir'), meaningOf(running)],
    }
  }
  if (!thrown)
    return { title, fields: [], rows: [], notes: [said('sectionDetails.part.dry.nothingOver')] }
  return {
    title,
    fields: [],
    rows: [
      row('sectionDetails.part.dry.mean', figure(thrown.mean, 'overtopping', 'up')),
      row('sectionDetails.part.dry.design', figure(thrown.design, 'overtopping', 'up')),
      row('sectionDetails.part.dry.perSection', figure(thrown.mean * length, 'flow', 'up')),
    ],
    notes: [
      meaningOf(thrown.design),
      said('sectionDetails.part.dry.source'),
      ...(thrown.isFitted
        ? []
        : [said('sectionDetails.part.dry.unfitted', { ratio: quantity(thrown.ratio, 'ratio') })]),
    ],
  }
}

function meaningOf(flow: number): Message {
  return said(
    `sectionDetails.part.dry.meaning.${flow <= AWARE ? 'little' : flow <= TRAINED ? 'trained' : 'nobody'}`,
  )
}

function pondPart({ section }: PartInput): PartGroup {
  const title = said('sectionDetails.part.dry.pond')
  const notes = [said('sectionDetails.part.dry.pondNote')]
  if (section.barrier.skirtLength === 0 || section.water.depth === 0)
    return { title, fields: [], rows: [], notes }
  const limit = pondLimit(section)
  const value =
    limit === null
      ? said('sectionDetails.part.dry.anyPond')
      : limit.dryDepth === null
        ? said('sectionDetails.part.dry.noPond')
        : figure(limit.dryDepth, 'length', 'down')
  return { title, fields: [], rows: [row('sectionDetails.part.dry.pondLimit', value)], notes }
}
