import { describe, expect, it } from 'vitest'
import { lineEvent } from '../../../shared/checks/line-event/line-event'
import type { LineEventInput } from '../../../shared/checks/line-event/line-event-input'
import { LineEventRun, type LineEventWork } from '../../../shared/checks/line-event/line-event-run'
import { computeLineEvent, type EventWorker } from '../../../src/line-event/compute-line-event'
import type { EventMessage } from '../../../src/line-event/messages'
import { flood } from '../../support/flood'
import { LOW_ROAD_SURVEY, lowRoadContent } from '../../support/ferry-quay'

const INPUT: LineEventInput = {
  survey: LOW_ROAD_SURVEY,
  content: lowRoadContent(),
  water: flood(),
  settings: { step: 1800, timeToClear: 1200, groundBefore: 'soaked', air: null, pond: null },
}

/** A worker that does its share when it is asked to, and knows whether it was ended. */
function workerFor(ended: { count: number }, isHanging = false): EventWorker {
  const worker: EventWorker = {
    onmessage: null,
    onerror: null,
    terminate: () => {
      ended.count += 1
    },
    postMessage: (work: LineEventWork) => {
      const say = (data: EventMessage) =>
        worker.onmessage?.call(worker as Worker, { data } as MessageEvent<EventMessage>)
      say({ kind: 'progress', share: 0.5 })
      if (isHanging) return
      queueMicrotask(() => say({ kind: 'done', outcomes: new LineEventRun(work).answer() }))
    },
  }
  return worker
}

describe('an event that is computed away from the page', () => {
  it('says the same in two workers, in slices and in one go, and shows its progress', async () => {
    const expected = lineEvent(INPUT)
    for (const startWorker of [null, () => workerFor({ count: 0 })]) {
      const seen: number[] = []
      const answer = await computeLineEvent(INPUT, {
        startWorker,
        onProgress: (share) => seen.push(share),
      })
      expect(answer).toEqual(expected)
      expect(seen.length).toBeGreaterThan(1)
      expect(seen.at(-1)).toBe(1)
    }
  })

  it('ends both workers when it is stopped', async () => {
    const ended = { count: 0 }
    const controller = new AbortController()
    const running = computeLineEvent(INPUT, {
      signal: controller.signal,
      startWorker: () => workerFor(ended, true),
    })
    controller.abort(new Error('stopped'))
    await expect(running).rejects.toThrow('stopped')
    expect(ended.count).toBe(2)
  })

  it('stops between slices where there are no workers', async () => {
    const controller = new AbortController()
    let last = 0
    const running = computeLineEvent(INPUT, {
      signal: controller.signal,
      startWorker: null,
      onProgress: (share) => {
        last = share
        controller.abort(new Error('stopped'))
      },
    })
    await expect(running).rejects.toThrow('stopped')
    expect(last).toBeLessThan(1)
  })

  it('refuses what cannot be computed before a worker is started', async () => {
    const running = computeLineEvent(
      { ...INPUT, settings: { ...INPUT.settings, step: 0 } },
      {
        startWorker: () => {
          throw new Error('a worker was started')
        },
      },
    )
    await expect(running).rejects.toThrow(/step: 0 is not allowed/)
  })
})
