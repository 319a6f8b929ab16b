import { describe, expect, it } from 'vitest'
import { CHECK_ROWS } from '../../../shared/verification'
import type { CheckRow } from '../../../shared/verification/check-row'
import { countByTag, groupByTopic, recompute } from '../../../shared/verification/recompute'

function rowOf(printed: string, compute: () => number, tag: CheckRow['tag'] = 'derived'): CheckRow {
  const figures = [{ label: 'x', printed, unit: 'm', compute }]
  return { id: printed, topic: 'ground', title: 'A case', source: 'a source', tag, figures }
}

describe('a check value recomputed', () => {
  it('shows two digits more than the printed figure, and the difference in the same digits', () => {
    const [row] = recompute([rowOf('0.49', () => 0.4923)])
    expect(row!.figures[0]).toMatchObject({ computed: '0.4923', difference: '+0.0023' })
    expect(row!.passes).toBe(true)
  })

  it('writes true minus signs', () => {
    const [row] = recompute([rowOf('-0.33', () => -0.3333)])
    const figure = { printed: '−0.33', computed: '−0.3333', difference: '−0.0033' }
    expect(row!.figures[0]).toMatchObject(figure)
  })

  it('shows no difference that is not there', () => {
    expect(recompute([rowOf('2', () => 2)])[0]!.figures[0]!.difference).toBe('0')
  })

  it.each([
    ['is off by more than half of its last digit', () => 0.496],
    ['is no number', () => Number.NaN],
    ['is refused', () => raise()],
  ])('fails, and stops nothing, where the figure %s', (_why, compute) => {
    const rows = recompute([rowOf('0.49', compute), rowOf('1', () => 1)])
    expect(rows.map(({ passes }) => passes)).toEqual([false, true])
  })

  it('computes each time anew', () => {
    let calls = 0
    const row = rowOf('1', () => (calls += 1))
    expect(recompute([row])[0]!.passes).toBe(true)
    expect(recompute([row])[0]!.passes).toBe(false)
  })
})

describe('counts', () => {
  it('are those of the rows by tag, never one number', () => {
    const rows = [rowOf('1', () => 1, 'published'), rowOf('2', () => 2, 'memory')]
    expect(countByTag(rows)).toEqual({ published: 1, memory: 1, derived: 0, practice: 0 })
    const all = Object.values(countByTag(CHECK_ROWS)).reduce((sum, count) => sum + count, 0)
    expect(all).toBe(CHECK_ROWS.length)
  })

  it('leave no row out of its topic', () => {
    const rows = groupByTopic(CHECK_ROWS).flatMap((group) => group.rows)
    expect(new Set(rows)).toEqual(new Set(CHECK_ROWS))
  })
})

function raise(): number {
  throw new Error('refused')
}
