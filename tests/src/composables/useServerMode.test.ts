import { effectScope } from 'vue'
import { describe, expect, it } from 'vitest'
import { ApiError } from '../../../src/api/request'
import { useServerMode } from '../../../src/composables/useServerMode'

const settled = () => new Promise((resolve) => setTimeout(resolve))

describe('the mode of the server', () => {
  it('is unknown until the server answers', async () => {
    const mode = effectScope().run(() => useServerMode(() => Promise.resolve('demonstration')))!
    expect(mode.value).toBeNull()
    await settled()
    expect(mode.value).toBe('demonstration')
  })

  it('stays unknown where no server answers, without a fuss', async () => {
    const mode = effectScope().run(() =>
      useServerMode(() => Promise.reject(Object.create(ApiError.prototype) as ApiError)),
    )!
    await settled()
    expect(mode.value).toBeNull()
  })
})
