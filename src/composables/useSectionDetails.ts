import { useI18n } from 'vue-i18n'
import { sectionDetails } from '@shared/texts/section-details.en'
import { useWords } from './useWords'

/** Words for the parts of a cross-section that are loaded when they are opened; they bring their texts along. */
export function useSectionDetails() {
  const { mergeLocaleMessage } = useI18n({ useScope: 'global' })
  mergeLocaleMessage('en', sectionDetails.en)
  return useWords()
}
