import type { JobOutcome } from '@shared/checks/line-event/job-outcome'

/** What a worker of an event says. */
export type EventMessage =
  | { readonly kind: 'progress'; readonly share: number }
  | { readonly kind: 'done'; readonly outcomes: readonly JobOutcome[] }
