import type { OfferedRemedy } from '@shared/checks/remedies/weakest-first'
import { useWords } from './useWords'

/** Words for remedies: what is done, what it costs, what it gains, what limits then. */
export function useRemedyWords() {
  const { t, q, given } = useWords()
  const down = (level: number) => q(level, 'length', { rounding: 'down' })
  const up = (length: number) => q(length, 'length', { rounding: 'up' })

  function what({ kind, run, value }: OfferedRemedy): string {
    const tube = run?.barrier.name ?? ''
    if (kind === 'move' && value === null) return t('layout.remedy.moveGround')
    return t(`layout.remedy.${kind}`, {
      tube,
      pressure: kind === 'air' && value !== null ? given(value, 'pressure') : '',
      length: value === null ? '' : up(value),
      level: value === null ? '' : up(value),
    })
  }

  function cost({ crewTime, mass }: OfferedRemedy): string {
    const minutes = Math.ceil(crewTime / 60 - 1e-9)
    if (minutes <= 0 && mass <= 0) return t('layout.weakest.costFree')
    const time = t('layout.totals.minutes', { minutes })
    return t('layout.weakest.cost', { time, mass: q(mass, 'mass') })
  }

  function gain({ holdsToLevel, limitedBy }: OfferedRemedy): string {
    if (holdsToLevel === null) return ''
    const level = down(holdsToLevel)
    if (limitedBy === null) return t('layout.weakest.gainMore', { level })
    return t('layout.weakest.gain', { level, then: t(`checks.then.${limitedBy}`) })
  }

  function next({ next: { place, holdsToLevel, check } }: OfferedRemedy): string {
    const chainage = String(Number(place.toFixed(2)))
    if (holdsToLevel === null) return t('layout.weakest.nextNone', { chainage })
    return t('layout.weakest.next', {
      level: down(holdsToLevel),
      chainage,
      check: t(`checks.name.${check ?? 'sliding'}`),
    })
  }

  return { what, cost, gain, next }
}
