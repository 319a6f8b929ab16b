import { BASIS_IDS } from '@shared/catalogue/check-bases'
import { GROUNDS } from '@shared/catalogue/grounds'
import type { UpliftModel } from '@shared/schemas/section-case'

/** How the water is entered. */
export const WATER_MODES = ['depth', 'level', 'gauge'] as const

/** Surface whose figures are typed, not from the catalogue. */
export const OWN_SURFACE = 'own'

/** Same names as `UPLIFT_MODELS` of the case, repeated so that zod stays out of this page. */
const UPLIFT_MODEL_IDS = [
  'linear',
  'deep',
  'developing',
  'none',
] as const satisfies readonly UpliftModel[]

/** What is chosen from a list, with the values it may take; the first one is not always the default. */
export const CHOICES = {
  waterMode: { key: 'water', options: WATER_MODES, initial: 'depth' },
  basis: { key: 'basis', options: BASIS_IDS, initial: 'global-1.5', isAlwaysSent: true },
  surface: {
    key: 'surface',
    options: [...GROUNDS.map((ground) => ground.id), OWN_SURFACE],
    initial: 'turf',
    isAlwaysSent: true,
  },
  suitable: { key: 'suitable', options: ['yes', 'no'], initial: 'yes' },
  upliftModel: { key: 'uplift', options: UPLIFT_MODEL_IDS, initial: 'linear' },
} as const satisfies Record<
  string,
  { key: string; options: readonly string[]; initial: string; isAlwaysSent?: true }
>

export type ChoiceId = keyof typeof CHOICES

export type Choices = Readonly<{ [K in ChoiceId]: (typeof CHOICES)[K]['options'][number] }>

export const CHOICE_IDS = Object.keys(CHOICES) as readonly ChoiceId[]

export const INITIAL_CHOICES: Choices = {
  waterMode: 'depth',
  basis: 'global-1.5',
  surface: 'turf',
  suitable: 'yes',
  upliftModel: 'linear',
}
