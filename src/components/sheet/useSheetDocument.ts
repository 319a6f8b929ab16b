import { computed, type Ref } from 'vue'
import { DerivationDisagreementError } from '@shared/derivation/disagreement'
import type { SheetRecord } from '@shared/schemas/sheet-api'
import { composeSheet, derivationOf } from '@shared/sheet/compose-sheet'
import type { SheetDocument } from '@shared/sheet/document'
import { sheetWords } from '@shared/sheet/sheet-words'
import type { ResolveText } from '@shared/texts/format-text'

export interface Composed {
  readonly document: SheetDocument
  /** Unrounded figures by the number of their line, in the unit in which they are printed. */
  readonly figures: ReadonlyMap<string, number>
  readonly say: ResolveText
}

/** The document of a sheet, or the line at which this version of the program disagrees with it. */
export function useSheetDocument(sheet: Ref<SheetRecord | undefined>) {
  const content = computed(() => sheet.value?.content)
  const status = computed(() => sheet.value?.status)
  return computed<Composed | { readonly stoppedAt: string } | null>(() => {
    if (!content.value || !status.value) return null
    const shown = { ...content.value, status: status.value }
    try {
      return {
        document: composeSheet(shown),
        figures: new Map(
          derivationOf(shown).lines.map(({ number, result }) => [number, result.value]),
        ),
        say: sheetWords(shown.units, shown.datum).resolve,
      }
    } catch (error) {
      if (!(error instanceof DerivationDisagreementError)) throw error
      return { stoppedAt: error.lineNumber }
    }
  })
}
