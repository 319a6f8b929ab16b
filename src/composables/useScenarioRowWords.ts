import type { BasisId } from '@shared/catalogue/check-bases'
import type { Scenario, ScenarioListItem } from '@shared/schemas/project'
import type { ScenarioSummary } from '@shared/schemas/scenario'
import { basisKey } from '@/quick-check/basis-key'
import { useLongSectionWords } from './useLongSectionWords'
import { useMoment } from './useMoment'
import { useWords } from './useWords'

/** Words of one scenario in the table and in the comparison. */
export function useScenarioRowWords() {
  const { t, q, given } = useWords()
  const { chainageWord } = useLongSectionWords()
  const moment = useMoment()

  function holdsToWords({ holdsToLevel }: ScenarioSummary): string {
    if (holdsToLevel === null) return t('linePage.scenarios.nothingHolds')
    return q(holdsToLevel, 'length', { rounding: 'down' })
  }

  function weakestWords({ weakest: { place, check } }: ScenarioSummary): string {
    const chainage = String(Number(place.toFixed(2)))
    if (check === null) return t('linePage.scenarios.weakestGap', { chainage })
    return t('linePage.scenarios.weakestWords', { chainage, check: t(`checks.name.${check}`) })
  }

  function edgeWords({ least, most }: ScenarioListItem['edges']): string {
    const [from, to] = [given(least, 'percent'), given(most, 'percent')]
    if (from === to) return t('linePage.scenarios.edgeWords', { share: to })
    return t('linePage.scenarios.edgesWords', { least: from, most: to })
  }

  const verdictWords = ({ verdict }: ScenarioSummary) => t(`checks.verdict.${verdict}`)
  const levelWords = ({ waterLevel }: ScenarioSummary) => q(waterLevel, 'length')
  const basisWords = (basis: string) => t(basisKey(basis as BasisId))
  const changedWords = ({ updatedAt, updatedBy }: Pick<Scenario, 'updatedAt' | 'updatedBy'>) =>
    t('linePage.scenarios.changed', { at: moment(updatedAt), by: updatedBy.name })

  /** One row as cells of text, in the order of the table. */
  function rowCells(row: ScenarioListItem): readonly string[] {
    return [
      row.name,
      levelWords(row.summary),
      basisWords(row.basis),
      edgeWords(row.edges),
      verdictWords(row.summary),
      weakestWords(row.summary),
      holdsToWords(row.summary),
      changedWords(row),
    ]
  }

  return {
    chainageWord,
    holdsToWords,
    weakestWords,
    verdictWords,
    levelWords,
    basisWords,
    edgeWords,
    changedWords,
    rowCells,
  }
}
