import type { Sheet } from '../../shared/schemas/sheet'
import { composeSheet } from '../../shared/sheet/compose-sheet'
import type { Chapter } from '../../shared/sheet/document'
import { sheetWords } from '../../shared/sheet/sheet-words'
import { sheetData, sheetPictures } from './sheet-data'
import type { Typesetter } from './typesetter'

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
  const document = composeSheet(sheet, chapters)
  const { resolve } = sheetWords(sheet.units, sheet.datum)
  return typesetter.typeset('sheet', {
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
  })
}
