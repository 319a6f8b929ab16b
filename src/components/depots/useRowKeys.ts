/** Keys of rows that have no id of their own: a row keeps its key while others come and go. */
export function useRowKeys(count: () => number) {
  let next = count()
  const keys = Array.from({ length: next }, (_, i) => i)
  return {
    of: (index: number): number => keys[index] ?? index,
    added: (): void => {
      keys.push(next)
      next += 1
    },
    removed: (index: number): void => {
      keys.splice(index, 1)
    },
  }
}
