import type { Sheet } from '../../shared/schemas/sheet'
import { composeSheet, derivationOf } from '../../shared/sheet/compose-sheet'
import { sheetTable } from '../../shared/sheet/sheet-table'
import { createTypesetter, type Typesetter } from './typesetter'
import { typesetOrder, type IssuedOrder } from './typeset-order'
import { typesetSheet } from './typeset-sheet'

/** What is done to sheets in a thread of their own. */
export function sheetTasks() {
  let kept: Typesetter | undefined
  const typesetter = () => (kept ??= createTypesetter())
  return {
    /** Loads what the others need. */
    warm: (_: null): null => {
      typesetter()
      return null
    },
    /** @throws DerivationDisagreementError */
    check: (sheet: Sheet): null => {
      composeSheet(sheet)
      return null
    },
    /** Numbers of the lines, and the unrounded figure of each in its printed unit. */
    lines: (sheet: Sheet): ReadonlyMap<string, number> =>
      new Map(derivationOf(sheet).lines.map(({ number, result }) => [number, result.value])),
    /** @throws DerivationDisagreementError; TypesettingError */
    pdf: (sheet: Sheet): Uint8Array => Uint8Array.from(typesetSheet(typesetter(), sheet)),
    /** @throws TypesettingError */
    order: (issued: IssuedOrder): Uint8Array => Uint8Array.from(typesetOrder(typesetter(), issued)),
    /** @throws DerivationDisagreementError */
    table: (sheet: Sheet) => sheetTable(sheet),
  }
}

export type SheetTasks = ReturnType<typeof sheetTasks>
