import type { LineContext } from './context'

/** Factors on friction and undrained strength, as they stand in a formula. */
export interface StrengthText {
  readonly friction: string
  readonly cohesion: string
}

export const UNFACTORED_STRENGTH: StrengthText = { friction: 'mu', cohesion: 'c_u' }
export const FACTORED_STRENGTH: StrengthText = { friction: 'mu / 1.25', cohesion: 'c_u / 1.4' }

/** True where the ground is soft: then the undrained strength bounds the friction. */
export function isSoft({ section }: Pick<LineContext, 'section'>): boolean {
  return (section.ground.undrainedStrength ?? null) !== null
}

/**
 * Resistance of the ground to a normal force over a length, as an expression.
 *
 * @param normal Expression of the normal force; in brackets unless it is one symbol.
 */
export function resistanceText(
  context: LineContext,
  normal: string,
  length: string,
  { friction, cohesion }: StrengthText = UNFACTORED_STRENGTH,
): string {
  const rubbing = `${friction} * ${normal}`
  if (!isSoft(context)) return rubbing
  context.book.given('c_u', context.section.ground.undrainedStrength ?? 0, 'pressure')
  return `min(${rubbing}, ${cohesion} * ${length}, 0.4 * ${normal})`
}
