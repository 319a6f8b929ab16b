import type { BasisId } from '@shared/catalogue/check-bases'
import type { EventSettings } from '@shared/schemas/event-settings'
import type { DeploymentSettings } from '@shared/schemas/deployment'
import type { SizeRun } from '@shared/schemas/scenario'
import { basisKey } from '@/quick-check/basis-key'
import {
  fieldValue,
  sizesInOrder,
  type FieldForm,
  type ScenarioField,
} from '@/scenario/scenario-fields'
import type { ScenarioState } from '@/scenario/scenario-state'
import { useLongSectionWords } from './useLongSectionWords'
import { useMoment } from './useMoment'
import { useWords } from './useWords'

/** Words for the fields of a scenario and for what stands in them. */
export function useScenarioFieldWords() {
  const { t, given } = useWords()
  const { surfaceWord } = useLongSectionWords()
  const at = useMoment()

  function fieldLabel({ labelKey, surface }: ScenarioField): string {
    const label = t(labelKey)
    if (surface === undefined) return label
    return t('scenarioPage.field.of', { field: label, surface: surfaceWord(surface) })
  }

  function fieldWords(state: ScenarioState, field: ScenarioField): string {
    const value = fieldValue(state, field)
    return value === null || value === ''
      ? t('scenarioPage.field.none')
      : wordsOf(value, field.form)
  }

  function wordsOf(value: unknown, form: FieldForm): string {
    if (form === 'text') return String(value)
    if (form === 'basis') return t(basisKey(value as BasisId))
    if (form === 'upliftModel') return t(`checks.upliftModel.${String(value)}`)
    if (form === 'suitable') return t(`quickCheck.ground.suitable.${value ? 'yes' : 'no'}`)
    if (form === 'event') return nightWords(value as EventSettings)
    if (form === 'sizes')
      return sizesInOrder(value as SizeRun[])
        .map(runWords)
        .join('; ')
    if (form === 'plan') return planWords(value as DeploymentSettings)
    return given(value as number, form)
  }

  /** The night in a few words: its air, and what the ground has seen. */
  function nightWords({ air, groundBefore }: EventSettings): string {
    const temperatures = air.map(({ temperature }) => given(temperature, 'temperature'))
    const words = temperatures.length > 0 ? temperatures.join(' → ') : t('scenarioPage.field.none')
    return `${t('eventPage.settings.air')}: ${words}; ${t(`eventPage.settings.${groundBefore}`)}`
  }

  function planWords({ decidedAt, pairs, blowers, order, judgedBy }: DeploymentSettings): string {
    return t('deployment.field', {
      decided: decidedAt === null ? t('scenarioPage.field.none') : at(decidedAt),
      pairs,
      blowers,
      order: t(`deployment.orderName.${order}`),
      band: t(`deployment.band.${judgedBy}`),
    })
  }

  function runWords({ from, to, barrier, edgeFactor }: SizeRun): string {
    const values = { from: String(from), to: String(to), tube: barrier.name }
    if (edgeFactor === null) return t('scenarioPage.field.run', values)
    return t('scenarioPage.field.runEdge', { ...values, share: given(edgeFactor, 'percent') })
  }

  return { fieldLabel, fieldWords }
}
