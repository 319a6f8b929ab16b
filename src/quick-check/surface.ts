import { GROUNDS } from '@shared/catalogue/grounds'
import type { FieldValues } from './case-input'
import type { Choices } from './choices'

/** What a surface of the catalogue sets when it is chosen. */
export interface SurfaceFigures {
  readonly values: Partial<FieldValues>
  readonly suitable: Choices['suitable']
}

/** Figures that a surface of the catalogue brings along; null for a surface of one's own. */
export function surfaceFigures(surface: string): SurfaceFigures | null {
  const ground = GROUNDS.find(({ id }) => id === surface)
  if (!ground) return null
  const { friction, permeability, layerThickness, isSuitable } = ground
  return {
    values: { friction, permeability, layerThickness },
    suitable: isSuitable ? 'yes' : 'no',
  }
}
