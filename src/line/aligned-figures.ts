/** Figures of a column with as many decimals as the longest has, so that their points stand in one line. */
export function alignedFigures(texts: readonly string[]): readonly string[] {
  const most = Math.max(0, ...texts.map(decimalsOf))
  return texts.map((text) => (isFigure(text) ? padded(text, most) : text))
}

const isFigure = (text: string) => /^[−-]?\d+(\.\d+)?$/.test(text)

const decimalsOf = (text: string) => (isFigure(text) ? (text.split('.')[1]?.length ?? 0) : 0)

function padded(text: string, decimals: number): string {
  const missing = decimals - decimalsOf(text)
  if (missing === 0) return text
  return `${text}${text.includes('.') ? '' : '.'}${'0'.repeat(missing)}`
}
