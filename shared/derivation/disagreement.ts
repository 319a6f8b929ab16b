/** What is wrong with a line. */
export type DisagreementReason = 'figure' | 'unit' | 'expression' | 'input' | 'missing'

/** A line of a derivation does not agree with its own inputs: no sheet may be made from it. */
export class DerivationDisagreementError extends Error {
  override readonly name = 'DerivationDisagreementError'

  constructor(
    /** Number of the line on the sheet, "3.2". */
    readonly lineNumber: string,
    readonly lineId: string,
    readonly reason: DisagreementReason,
    /** What does not agree, in words. */
    readonly detail: string,
  ) {
    super(`line ${lineNumber} (${lineId}): ${detail}`)
  }
}
