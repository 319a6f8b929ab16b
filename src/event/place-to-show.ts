import type { LineEventAnswer } from '@shared/checks/line-event/line-event-answer'

/** The section that is looked at first: the one that fails first, else the one that is left first. */
export function placeToShow({ bands, sections }: LineEventAnswer): number {
  const { first, leave } = bands.expected
  const computed = sections.findIndex(({ shown }) => shown !== null)
  return first?.section ?? leave?.section ?? Math.max(0, computed)
}
