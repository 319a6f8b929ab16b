import type { SectionCase } from '@shared/schemas/section-case'
import type { Message } from '@shared/texts/format-text'

/** Current, waves and debris as far as they are entered; one text that says so where none is. */
export function actingWater({ water, debris }: SectionCase): readonly Message[] {
  const { currentSpeed, waveHeight } = water
  const acting: Message[] = []
  if (currentSpeed > 0)
    acting.push({
      key: 'quickCheck.wetSide.acting.current',
      values: { speed: { value: currentSpeed, kind: 'speed' } },
    })
  if (waveHeight > 0)
    acting.push({
      key: 'quickCheck.wetSide.acting.waves',
      values: { height: { value: waveHeight, kind: 'length' } },
    })
  if (debris.force > 0)
    acting.push({
      key: 'quickCheck.wetSide.acting.debris',
      values: { force: { value: debris.force, kind: 'force' } },
    })
  return acting.length > 0 ? acting : [{ key: 'quickCheck.wetSide.acting.none' }]
}
