import type { DeploymentPlan } from '../../schemas/deployment'
import type { MeasureText } from '../text-width'

/** What the timeline of a deployment is drawn from. */
export interface TimelineInput {
  readonly plan: DeploymentPlan
  /** Room across [px]; the height follows from pairs and sections. */
  readonly width: number
  /** A moment with its day in the time zone of the project: "Tue 01:41". */
  readonly dayTime: (moment: number) => string
  /** What the clock of that zone is ahead of UTC [ms], so that ticks stand at whole hours. */
  readonly clockOffset: number
  readonly measure?: MeasureText
}
