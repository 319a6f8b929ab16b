import { computed, ref, toValue, watch, type MaybeRefOrGetter } from 'vue'

/** Rows of a survey on one page: a screen of them, and quick to draw. */
export const ROWS_AT_ONCE = 50

/** A long list of rows cut into pages; each row keeps its place in the whole. */
export function useRowPages<Row>(rows: MaybeRefOrGetter<readonly Row[]>) {
  const page = ref(1)
  const total = computed(() => toValue(rows).length)
  const shown = computed(() => {
    const first = (page.value - 1) * ROWS_AT_ONCE
    const here = toValue(rows).slice(first, first + ROWS_AT_ONCE)
    return here.map((row, i) => ({ row, index: first + i }))
  })

  /** Turns to the page of a row. */
  function turnTo(index: number): void {
    page.value = Math.floor(Math.max(0, index) / ROWS_AT_ONCE) + 1
  }
  watch(total, (now) => {
    if ((page.value - 1) * ROWS_AT_ONCE >= now) turnTo(now - 1)
  })

  return { page, total, shown, turnTo }
}
