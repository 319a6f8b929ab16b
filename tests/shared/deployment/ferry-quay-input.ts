import { OFF_THE_GRAVEL_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_SCENARIOS } from '../../../server/demo/ferry-quay-scenarios'
import { MILL_LANE, WORKS_YARD } from '../../../server/demo/ferry-quay-store'
import type { DeploymentInput } from '../../../shared/deployment/groundwork'
import {
  deploymentSettingsSchema,
  type DeploymentSettings,
} from '../../../shared/schemas/deployment'
import { forecastLevels, quayMoment } from './forecast-levels'

export const OPEN_EDGE = LOW_ROAD_SCENARIOS.find(({ key }) => key === 'open-edge')!.content

/** Ferry Quay decided at 22:10, two pairs with one blower, gust 9 m/s. */
export function ferryQuayInput(changes: Partial<DeploymentSettings> = {}): DeploymentInput {
  const settings = deploymentSettingsSchema.parse({ gust: 9, ...changes })
  return {
    survey: { stations: OFF_THE_GRAVEL_STATIONS, sectionLength: 10, marks: [] },
    content: OPEN_EDGE,
    settings: { ...settings, decidedAt: quayMoment('22:10') },
    depots: [MILL_LANE, WORKS_YARD],
    levels: forecastLevels,
  }
}
