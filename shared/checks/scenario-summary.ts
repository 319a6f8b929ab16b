import type { Survey } from '../schemas/line-faults'
import type { ScenarioContent, ScenarioSummary } from '../schemas/scenario'
import { checkLine, type HoldingProfiles, type LineAnswer } from './line-check'

/** The answer for a line in the few figures that lists and desks show. */
export function summaryOf(answer: LineAnswer, waterLevel: number): ScenarioSummary {
  const { weakest, sections, verdict } = answer
  const isRelied = (section: { verdict: string }) =>
    section.verdict === 'holds' || section.verdict === 'narrow'
  return {
    verdict,
    waterLevel,
    weakest: {
      from: weakest.from,
      to: weakest.to,
      place: weakest.place,
      check: weakest.limitedBy ?? weakest.governs,
      utilisation: weakest.utilisation,
    },
    holdsToLevel: weakest.holdsToLevel,
    sections: sections.length,
    failing: sections.filter((section) => !isRelied(section)).length,
  }
}

/**
 * What is stored beside a scenario: every section of its line checked, and the weakest one named.
 *
 * @param survey Stations in order of chainage, and the section length laid on them.
 * @param profiles See `checkLine`.
 */
export function scenarioSummary(
  survey: Survey,
  content: ScenarioContent,
  profiles?: HoldingProfiles,
): ScenarioSummary {
  const answer = checkLine(survey, content, profiles)
  return summaryOf(answer, content.waterLevel)
}
