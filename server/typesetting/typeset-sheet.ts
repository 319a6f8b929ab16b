import type { Sheet } from '../../shared/schemas/sheet'
import { composeSheet } from '../../shared/sheet/compose-sheet'
import type { Chapter } from '../../shared/sheet/document'
import { sheetWords } from '../../shared/sheet/sheet-words'
import { sheetData, sheetPictures } from './sheet-data'
import type { TypesetInput, Typesetter } from './typesetter'

/** Name of the file inside the PDF from which a sheet can be read again. */
export const SHEET_ATTACHMENT = 'sheet.json'

/**
 * A sheet as PDF, with the sheet itself inside it as JSON.
 *
 * @param chapters See `composeSheet`.
 * @throws DerivationDisagreementError where a line does not agree: then there is no sheet.
 */
export function typesetSheet(
  typesetter: Typesetter,
  sheet: Sheet,
  chapters: readonly Chapter[] = [],
): Buffer {
  return typesetter.typeset('sheet', sheetInput(sheet, chapters))
}

/** The pages of a sheet as one drawing, under each other. */
export function drawSheet(typesetter: Typesetter, sheet: Sheet): string {
  return typesetter.draw('sheet', sheetInput(sheet, []))
}

function sheetInput(sheet: Sheet, chapters: readonly Chapter[]): TypesetInput {
  const document = composeSheet(sheet, chapters)
  const { resolve } = sheetWords(sheet.units, sheet.datum)
  return {
    data: sheetData(document, resolve),
    pictures: sheetPictures(document),
    attachments: [
      {
        name: SHEET_ATTACHMENT,
        mediaType: 'application/json',
        text: JSON.stringify(sheet, null, 2),
        description: document.attachment,
      },
    ],
  }
}
