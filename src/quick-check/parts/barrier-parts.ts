import { bend, stepArea } from '@shared/calc/line/bend'
import { edgeBallast } from '@shared/calc/moving-water/edge-ballast'
import { LARGEST_CLOSURE_TURN } from '@shared/catalogue/joints'
import { holdingProfile, holdsToAt } from '@shared/checks/holds-to'
import { nextTube } from '@/quick-check/tube'
import { bendShare, opensTooFar } from './front-part'
import { figure, quantity, said, type PartGroup, type PartInput, type PartRow } from './part'

/** The skirt edge: what it lets under, what weighs it, and a current that would lift it. */
export function edgePart(input: PartInput): readonly PartGroup[] {
  const { section, evaluation, values } = input
  const { uplift, waterOnSkirt } = evaluation.vertical
  const under = {
    title: null,
    fields: [],
    rows: [
      {
        name: said('sectionDetails.part.edge.under'),
        value: figure(uplift, 'forcePerLength', 'up'),
      },
      {
        name: said('sectionDetails.part.edge.onSkirt'),
        value: figure(waterOnSkirt, 'forcePerLength', 'down'),
      },
    ],
    notes: [said('sectionDetails.part.edge.where'), said('sectionDetails.part.edge.unverified')],
  } as const
  const { edgeCurrent: speed, ballastDensity } = values
  const rows: PartRow[] = []
  if (speed !== null && speed > 0 && ballastDensity !== null) {
    const { density } = section.water
    const mass = edgeBallast({ speed, density, ballastDensity, gravity: section.gravity })
    const whole = mass * section.barrier.sectionLength
    rows.push(
      {
        name: said('sectionDetails.part.edge.ballast'),
        value: figure(mass, 'massPerLength', 'up'),
      },
      { name: said('sectionDetails.part.edge.ballastSection'), value: figure(whole, 'mass', 'up') },
    )
  }
  return [
    under,
    {
      title: said('sectionDetails.part.edge.lifted'),
      fields: ['edgeCurrent', 'ballastDensity'],
      rows,
      notes: [said('sectionDetails.part.edge.source')],
    },
  ]
}

/** A joint at which the line turns, and a step to the next size. */
export function bendsPart(input: PartInput): readonly PartGroup[] {
  return [bendGroup(input), stepGroup(input)]
}

function bendGroup(input: PartInput): PartGroup {
  const { section, values } = input
  const { turn } = values
  const notes = [said('sectionDetails.part.bends.note'), said('sectionDetails.part.bends.source')]
  const group = { title: null, fields: ['turn'], notes } as const
  if (turn === null || turn === 0) return { ...group, rows: [] }
  const { diameter, skirtLength, sectionLength } = section.barrier
  const answer = bend({
    angle: turn,
    diameter,
    skirtLength,
    sectionLength,
    largestTurn: LARGEST_CLOSURE_TURN,
  })
  const rows: PartRow[] = [
    { name: said('sectionDetails.part.bends.closures'), value: figure(answer.closures, 'count') },
    {
      name: said('sectionDetails.part.bends.gap'),
      value: figure(answer.outerGap, 'smallLength', 'up'),
    },
  ]
  if (turn < 0)
    return { ...group, rows: [...rows], notes: [said('sectionDetails.part.bends.folds'), ...notes] }
  const share = bendShare(section, turn)
  const holds = holdsToAt(holdingProfile(section, share), section.water.depth)
  return {
    ...group,
    rows: [
      ...rows,
      {
        name: said('sectionDetails.part.bends.missing'),
        value: figure(answer.missingSkirt, 'area', 'up'),
      },
      {
        name: said('sectionDetails.part.bends.lost'),
        value: figure(answer.lostShare, 'percent', 'up'),
      },
      {
        name: said('sectionDetails.part.bends.holdsTo'),
        value:
          holds.from === null
            ? said('sectionDetails.part.bends.nothing')
            : figure(holds.depth, 'length', 'down'),
        isWarning: opensTooFar(input),
      },
    ],
  }
}

function stepGroup({ section }: PartInput): PartGroup {
  const { diameter } = section.barrier
  const next = nextTube(diameter)
  const title = said('sectionDetails.part.bends.step')
  if (!next)
    return { title, fields: [], rows: [], notes: [said('sectionDetails.part.bends.noStep')] }
  const named = { diameter: quantity(next.diameter, 'length') }
  return {
    title,
    fields: [],
    rows: [
      {
        name: said('sectionDetails.part.bends.stepArea', named),
        value: figure(stepArea(next.diameter, diameter), 'area', 'up'),
      },
    ],
    notes: [said('sectionDetails.part.bends.stepNote')],
  }
}
