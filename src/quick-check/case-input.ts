import { GROUNDS } from '@shared/catalogue/grounds'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Choices } from './choices'
import type { FieldId } from './fields'

/** Every number of the Quick check in SI; null: left empty. */
export type FieldValues = Readonly<Record<FieldId, number | null>>

/** What the figures on the page belong to. */
export interface CaseInput {
  readonly values: FieldValues
  readonly choices: Choices
}

/** A field that must not be empty has a number in a valid input; an empty one never reaches a calculation. */
function given(value: number | null): number {
  return value ?? Number.NaN
}

/** False for a ground that the catalogue marks as unsuitable: loose gravel, bare mud. */
function isSuitableSurface(surface: string): boolean {
  return GROUNDS.find(({ id }) => id === surface)?.isSuitable ?? true
}

/** Water level on the wet side [m above datum], null while the water is entered as a depth. */
export function waterLevel({ values, choices }: CaseInput): number | null {
  if (choices.waterMode === 'level') return given(values.level)
  if (choices.waterMode === 'gauge') return given(values.stage) + gaugeOffset(values)
  return null
}

/** What is added to a gauge reading to give the level at the site [m]. */
export function gaugeOffset(values: FieldValues): number {
  return given(values.gaugeZero) + given(values.gaugeCorrection)
}

/** Ground level at the barrier [m above datum], null while only the depth is known. */
export function groundLevel({ values, choices }: CaseInput): number | null {
  return choices.waterMode === 'depth' ? null : given(values.groundLevel)
}

/** Depth of water: entered, or level less ground. */
export function waterDepth(input: CaseInput): number {
  const level = waterLevel(input)
  if (level === null) return given(input.values.depth)
  return tidy(level - given(input.values.groundLevel))
}

/** The cross-section that this input describes, SI units. */
export function sectionCase(input: CaseInput): SectionCase {
  const { values, choices } = input
  const isDeveloping = choices.upliftModel === 'developing'
  return {
    barrier: barrierOf(values),
    ground: {
      friction: given(values.friction),
      fall: given(values.fall),
      // What the catalogue calls unsuitable stays so; another surface is the user's own to judge.
      suitable: choices.suitable === 'yes' && isSuitableSurface(choices.surface),
      permeability: values.permeability,
      layerThickness: values.layerThickness,
      undrainedStrength: values.undrainedStrength,
    },
    uplift: {
      model: choices.upliftModel,
      edgeFactor: given(values.edgeFactor),
      weighedEdgeFactor: given(values.weighedEdge),
      diffusivity: isDeveloping ? values.diffusivity : null,
      time: isDeveloping ? values.upliftTime : null,
    },
    water: waterOf(input),
    debris: { force: given(values.debrisForce), draught: given(values.draught) },
    gravity: given(values.gravity),
    requiredFreeboard: given(values.requiredFreeboard),
    basis: choices.basis,
  }
}

function barrierOf(values: FieldValues): SectionCase['barrier'] {
  return {
    diameter: given(values.diameter),
    skirtLength: given(values.skirtLength),
    contactWidth: given(values.contactWidth),
    mass: given(values.mass),
    airPressure: given(values.airPressure),
    sectionLength: given(values.sectionLength),
    fabricStrength: values.fabricStrength,
  }
}

function waterOf(input: CaseInput): SectionCase['water'] {
  const { values } = input
  return {
    depth: waterDepth(input),
    dryDepth: given(values.dryDepth),
    density: given(values.density),
    currentSpeed: given(values.currentSpeed),
    dragCoefficient: given(values.dragCoefficient),
    waveHeight: given(values.waveHeight),
    wavePeriod: values.wavePeriod,
  }
}

/** Depth of the water at this moment, null where it is not entered; negative while the ground is dry. */
export function depthNow(input: CaseInput): number | null {
  const { waterNow } = input.values
  if (waterNow === null) return null
  return tidy(waterNow - entryOfGround(input))
}

/** What stands in the water's own field where the ground is: 0, the ground level, or its gauge reading. */
function entryOfGround({ values, choices }: CaseInput): number {
  if (choices.waterMode === 'depth') return 0
  const ground = given(values.groundLevel)
  return choices.waterMode === 'level' ? ground : ground - gaugeOffset(values)
}

/** The change that brings the water to this depth, in the way in which the water is entered. */
export function changeForDepth(input: CaseInput, depth: number): Partial<FieldValues> {
  const entry = tidy(entryOfGround(input) + depth)
  if (input.choices.waterMode === 'depth') return { depth }
  return input.choices.waterMode === 'level' ? { level: entry } : { stage: entry }
}

/** The changes that keep the water where it is when it is entered in another way. */
export function changeForMode(
  input: CaseInput,
  waterMode: CaseInput['choices']['waterMode'],
): Partial<FieldValues> {
  const next = { values: input.values, choices: { ...input.choices, waterMode } }
  const now = depthNow(input)
  return {
    ...changeForDepth(next, waterDepth(input)),
    waterNow: now === null ? null : tidy(entryOfGround(next) + now),
  }
}

/** Removes what binary addition leaves behind a tenth of a micrometre. */
export function tidy(length: number): number {
  return Number(length.toFixed(7))
}
