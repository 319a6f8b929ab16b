import type { Sheet } from '../schemas/sheet'
import type { DraftWords } from '../schemas/sheet-api'

/** What somebody writes of a sheet, beside its figures. */
export function draftWords(sheet: Sheet): DraftWords {
  const { place: title, project, category, purpose, revisionReason, conditions } = sheet
  const { assumptions, inputSources, paper, units, photographs } = sheet
  return {
    ...{ title, project, category, purpose, revisionReason, conditions },
    ...{ assumptions, inputSources, paper, units },
    photographs: photographs.flatMap(({ fileId, caption }) =>
      fileId === '' ? [] : [{ fileId, caption }],
    ),
  }
}
