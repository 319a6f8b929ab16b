import { describe, expect, it } from 'vitest'
import { ApiError } from '../../../src/api/request'
import { useSubmit } from '../../../src/composables/useSubmit'

/** A call whose answers come when the test says so. */
function slowCall() {
  const waiting: { give: (answer: string) => void; fail: (error: Error) => void }[] = []
  const call = (_input: number) =>
    new Promise<string>((give, fail) => {
      waiting.push({ give, fail })
    })
  return { call, waiting }
}

describe('a submit', () => {
  it('gives the answer and is pending until then', async () => {
    const { call, waiting } = slowCall()
    const { result, isPending, submit } = useSubmit(call)
    const answer = submit(1)
    expect(isPending.value).toBe(true)
    waiting[0]!.give('done')
    expect(await answer).toBe('done')
    expect([result.value, isPending.value]).toEqual(['done', false])
  })

  it('lets the newest call win, whichever answers first', async () => {
    const { call, waiting } = slowCall()
    const { result, isPending, submit } = useSubmit(call)
    const older = submit(1)
    const newer = submit(2)
    waiting[1]!.give('newer')
    await newer
    waiting[0]!.give('older')
    expect(await older).toBeUndefined()
    expect([result.value, isPending.value]).toEqual(['newer', false])
  })

  it('keeps what the server refused, until the next attempt', async () => {
    const { call, waiting } = slowCall()
    const { problem, submit } = useSubmit(call)
    const refused = submit(1)
    waiting[0]!.fail(new ApiError('no', 422))
    expect(await refused).toBeUndefined()
    expect(problem.value?.status).toBe(422)
    void submit(2)
    expect(problem.value).toBeNull()
  })

  it('drops an older refusal', async () => {
    const { call, waiting } = slowCall()
    const { problem, submit } = useSubmit(call)
    const older = submit(1)
    const newer = submit(2)
    waiting[0]!.fail(new ApiError('no', 422))
    await older
    expect(problem.value).toBeNull()
    waiting[1]!.give('yes')
    await newer
  })

  it('lets a fault of the program travel on', async () => {
    const { problem, isPending, submit } = useSubmit(() => Promise.reject(new TypeError('fault')))
    await expect(submit()).rejects.toThrow('fault')
    expect([problem.value, isPending.value]).toEqual([null, false])
  })
})
