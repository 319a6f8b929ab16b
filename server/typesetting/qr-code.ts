import { encode } from 'uqr'

/** A QR symbol as SVG, one unit a module, with its quiet zone. */
export function qrCode(text: string): string {
  const { data, size } = encode(text, { ecc: 'M', border: 2 })
  const squares = data.flatMap((row, y) =>
    row.flatMap((isDark, x) => (isDark ? [`M${x} ${y}h1v1h-1z`] : [])),
  )
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${size} ${size}">` +
    `<path d="${squares.join('')}" fill="#1b2a33"/></svg>`
  )
}
