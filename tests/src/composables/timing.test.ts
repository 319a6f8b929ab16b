// @vitest-environment jsdom
import { effectScope, nextTick, ref } from 'vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { useAnnouncement } from '../../../src/composables/useAnnouncement'
import { useCalm } from '../../../src/composables/useCalm'
import { useDeferred } from '../../../src/composables/useDeferred'

function inScope<T>(make: () => T): { made: T; stop: () => void } {
  const scope = effectScope()
  return { made: scope.run(make)!, stop: () => scope.stop() }
}

beforeEach(() => vi.useFakeTimers())
afterEach(() => vi.useRealTimers())

describe('a deferred result', () => {
  it('stays, marked as pending, until its source has settled, and is worked out once', async () => {
    const source = ref(1)
    const compute = vi.fn((value: number) => value * 10)
    const { made } = inScope(() => useDeferred(() => source.value, compute, 10))
    expect(made.isPending.value).toBe(false)
    for (const value of [2, 3, 4]) {
      source.value = value
      await nextTick()
      vi.advanceTimersByTime(50)
    }
    expect(made.result.value).toBe(10)
    expect(made.isPending.value).toBe(true)
    vi.advanceTimersByTime(1000)
    expect(made.result.value).toBe(40)
    expect(made.isPending.value).toBe(false)
    expect(compute).toHaveBeenCalledTimes(1)
  })

  it('is not worked out any more once nobody waits for it', async () => {
    const source = ref(1)
    const compute = vi.fn((value: number) => value)
    const { stop } = inScope(() => useDeferred(() => source.value, compute, 1))
    source.value = 2
    await nextTick()
    stop()
    vi.advanceTimersByTime(1000)
    expect(compute).not.toHaveBeenCalled()
  })
})

describe('a calm value', () => {
  it('follows a stream of changes now and then, and always ends at the last one', async () => {
    const source = ref(0)
    const { made } = inScope(() => useCalm(() => source.value))
    const seen = new Set<number>()
    for (let value = 1; value <= 60; value += 1) {
      source.value = value
      await nextTick()
      vi.advanceTimersByTime(16)
      seen.add(made.value)
    }
    vi.advanceTimersByTime(500)
    expect(made.value).toBe(60)
    expect(seen.size).toBeGreaterThan(3)
    expect(seen.size).toBeLessThan(12)
  })
})

describe('an announcement', () => {
  it('says nothing at first, and then only the sentence that rests', async () => {
    const sentence = ref('Holds.')
    const { made } = inScope(() => useAnnouncement(() => sentence.value))
    vi.advanceTimersByTime(5000)
    expect(made.value).toBe('')
    for (const next of ['Holds narrowly.', 'Does not hold.']) {
      sentence.value = next
      await nextTick()
      vi.advanceTimersByTime(300)
    }
    expect(made.value).toBe('')
    vi.advanceTimersByTime(2000)
    expect(made.value).toBe('Does not hold.')
  })
})
