/** A moment in a mail, whose reader's time zone is not known: "2031-03-03 21:45 UTC". */
export function momentText(moment: number): string {
  return `${new Date(moment).toISOString().slice(0, 16).replace('T', ' ')} UTC`
}
