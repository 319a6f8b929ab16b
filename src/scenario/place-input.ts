import type { CatalogueBarrier } from '@shared/catalogue/barriers'
import { EDGE_FACTORS } from '@shared/checks/what-decides'
import type {
  GroundAssumption,
  ScenarioBarrier,
  ScenarioContent,
  SizeRun,
} from '@shared/schemas/scenario'
import { INITIAL_VALUES } from '@/quick-check/address'
import type { CaseInput, FieldValues } from '@/quick-check/case-input'
import { CHOICES, INITIAL_CHOICES, OWN_SURFACE, type Choices } from '@/quick-check/choices'
import { FIELD_IDS, type FieldId } from '@/quick-check/fields'
import { matchingTube } from '@/quick-check/tube'
import type { PlaceOnLine } from './place-on-line'
import type { TubeBook } from './tube-book'

/**
 * A scenario at a place as the panels of the Quick check show it. The water is not in it: a scenario
 * keeps levels, and its own panel shows them.
 */
export function inputAtPlace(content: ScenarioContent, place: PlaceOnLine): CaseInput {
  return { values: valuesAt(content, place), choices: choicesAt(content, place) }
}

function valuesAt(content: ScenarioContent, { run, assumption }: PlaceOnLine): FieldValues {
  const { water, debris, uplift } = content
  return {
    ...INITIAL_VALUES,
    depth: 0,
    dryDepth: 0,
    uncertainty: 0,
    waterNow: null,
    currentSpeed: water.currentSpeed,
    dragCoefficient: water.dragCoefficient,
    waveHeight: water.waveHeight,
    wavePeriod: water.wavePeriod,
    density: water.density,
    debrisForce: debris.force,
    draught: debris.draught,
    gravity: content.gravity,
    rateOfRise: content.rateOfRise,
    clearTime: content.timeToClear,
    requiredFreeboard: content.requiredFreeboard,
    fall: content.fall,
    diffusivity: uplift.diffusivity,
    upliftTime: uplift.time,
    edgeFactor: run?.edgeFactor ?? uplift.edgeFactor,
    weighedEdge: uplift.weighedEdgeFactor ?? EDGE_FACTORS.weighed,
    ...(run ? barrierValues(run.barrier) : {}),
    ...(assumption
      ? {
          friction: assumption.friction,
          permeability: assumption.permeability,
          layerThickness: assumption.layerThickness,
          undrainedStrength: assumption.undrainedStrength ?? null,
        }
      : {}),
  }
}

function barrierValues(barrier: ScenarioBarrier) {
  const { diameter, skirtLength, contactWidth, mass, airPressure } = barrier
  const { sectionLength, fabricStrength, statedHeight } = barrier
  return {
    diameter,
    skirtLength,
    contactWidth,
    mass,
    airPressure,
    sectionLength,
    fabricStrength,
    statedHeight,
  }
}

function choicesAt(content: ScenarioContent, { surface, assumption }: PlaceOnLine): Choices {
  const surfaces: readonly string[] = CHOICES.surface.options
  return {
    ...INITIAL_CHOICES,
    basis: content.basis,
    surface: surfaces.includes(surface) ? surface : OWN_SURFACE,
    suitable: (assumption?.suitable ?? true) ? 'yes' : 'no',
    upliftModel: content.uplift.model,
  }
}

/** Where a number of the panels goes in a scenario. */
type Write = (content: ScenarioContent, value: number | null, place: PlaceOnLine) => ScenarioContent

const WRITES: Partial<Record<FieldId, Write>> = {
  currentSpeed: inWater('currentSpeed'),
  dragCoefficient: inWater('dragCoefficient'),
  waveHeight: inWater('waveHeight'),
  wavePeriod: inWater('wavePeriod'),
  density: inWater('density'),
  debrisForce: inDebris('force'),
  draught: inDebris('draught'),
  diffusivity: (content, diffusivity) => withUplift(content, { diffusivity }),
  upliftTime: (content, time) => withUplift(content, { time }),
  edgeFactor: writeEdge,
  weighedEdge: (content, value) =>
    withUplift(content, { weighedEdgeFactor: value ?? EDGE_FACTORS.weighed }),
  gravity: (content, value) => ({ ...content, gravity: value ?? content.gravity }),
  rateOfRise: (content, rateOfRise) => ({ ...content, rateOfRise }),
  clearTime: (content, value) => ({ ...content, timeToClear: value ?? content.timeToClear }),
  requiredFreeboard: (content, value) => ({
    ...content,
    requiredFreeboard: value ?? content.requiredFreeboard,
  }),
  fall: (content, value) => ({ ...content, fall: value ?? content.fall }),
  friction: inGround('friction'),
  permeability: inGround('permeability'),
  layerThickness: inGround('layerThickness'),
  undrainedStrength: inGround('undrainedStrength'),
  diameter: inBarrier('diameter'),
  skirtLength: inBarrier('skirtLength'),
  contactWidth: inBarrier('contactWidth'),
  mass: inBarrier('mass'),
  airPressure: inBarrier('airPressure'),
  sectionLength: inBarrier('sectionLength'),
  fabricStrength: inBarrier('fabricStrength'),
  statedHeight: inBarrier('statedHeight'),
}

/** The scenario with what was changed in the panels; the very same object where nothing was. */
export function withInputAtPlace(
  content: ScenarioContent,
  place: PlaceOnLine,
  input: CaseInput,
  tubes: TubeBook,
): ScenarioContent {
  const before = inputAtPlace(content, place)
  const changed = FIELD_IDS.filter((id) => input.values[id] !== before.values[id])
  const written = changed.reduce(
    (next, id) => WRITES[id]?.(next, input.values[id], place) ?? next,
    content,
  )
  const named = written.sizes === content.sizes ? written : withName(written, place, tubes)
  return withChoices(named, place, { from: before.choices, to: input.choices })
}

function withChoices(
  content: ScenarioContent,
  place: PlaceOnLine,
  { from, to }: { from: Choices; to: Choices },
): ScenarioContent {
  let next = content
  if (to.basis !== from.basis) next = { ...next, basis: to.basis }
  if (to.upliftModel !== from.upliftModel) next = withUplift(next, { model: to.upliftModel })
  if (to.suitable !== from.suitable) {
    next = withGround(next, place.surface, { suitable: to.suitable === 'yes' })
  }
  return next
}

function inWater(field: keyof ScenarioContent['water']): Write {
  return (content, value) => ({ ...content, water: { ...content.water, [field]: value } })
}

function inDebris(field: keyof ScenarioContent['debris']): Write {
  return (content, value) => ({ ...content, debris: { ...content.debris, [field]: value } })
}

function inGround(field: Exclude<keyof GroundAssumption, 'surface' | 'suitable'>): Write {
  return (content, value, { surface }) => withGround(content, surface, { [field]: value })
}

function inBarrier(field: keyof ScenarioBarrier): Write {
  return (content, value, { runIndex }) =>
    withRun(content, runIndex, ({ barrier, ...run }) => ({
      ...run,
      barrier: { ...barrier, [field]: value },
    }))
}

/** The edge of the run, where the run has its own; else that of the whole line. */
function writeEdge(
  content: ScenarioContent,
  value: number | null,
  { run, runIndex }: PlaceOnLine,
): ScenarioContent {
  if (value === null) return content
  if (typeof run?.edgeFactor !== 'number') return withUplift(content, { edgeFactor: value })
  return withRun(content, runIndex, (own) => ({ ...own, edgeFactor: value }))
}

function withUplift(
  content: ScenarioContent,
  change: Partial<ScenarioContent['uplift']>,
): ScenarioContent {
  return { ...content, uplift: { ...content.uplift, ...change } }
}

function withGround(content: ScenarioContent, surface: string, change: object): ScenarioContent {
  const grounds = content.grounds.map((ground) =>
    ground.surface === surface ? { ...ground, ...change } : ground,
  )
  return { ...content, grounds }
}

function withRun(
  content: ScenarioContent,
  index: number,
  change: (run: SizeRun) => SizeRun,
): ScenarioContent {
  if (index < 0) return content
  return { ...content, sizes: content.sizes.map((run, i) => (i === index ? change(run) : run)) }
}

/** A barrier is called after the catalogue as long as its figures are those of the catalogue. */
function withName(
  content: ScenarioContent,
  { runIndex }: PlaceOnLine,
  tubes: TubeBook,
): ScenarioContent {
  return withRun(content, runIndex, (run) => ({
    ...run,
    barrier: namedBarrier(run.barrier, tubes),
  }))
}

/** Name and origin of a barrier by its figures. */
export function namedBarrier(barrier: ScenarioBarrier, tubes: TubeBook): ScenarioBarrier {
  const tube = matchingTube((id) => barrier[id as keyof ScenarioBarrier] as number | null)
  const origin = tube
    ? originOf(tube, barrier, tubes)
    : { catalogueId: null, catalogueRevision: null }
  return {
    ...barrier,
    name: tubes.nameOf(barrier.diameter),
    ...origin,
  }
}

/** A tube that was in the scenario keeps the revision that it came with. */
function originOf(tube: CatalogueBarrier, barrier: ScenarioBarrier, tubes: TubeBook) {
  const kept = tube.id === barrier.catalogueId ? barrier.catalogueRevision : null
  return { catalogueId: tube.id, catalogueRevision: kept ?? tubes.revisionOf(tube) }
}
