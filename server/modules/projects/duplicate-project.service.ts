import type { Project } from '../../../shared/schemas/project'
import type { SignedIn } from '../../http/operation'
import { recordAudit } from '../audit/record-audit'
import { makeGauge } from '../gauges/gauges.service'
import { listGauges } from '../gauges/gauges.queries'
import { copyLine } from '../lines/line-rows'
import { listLineIds } from '../lines/lines.queries'
import { change, type ProjectWork } from './deed'
import { noProject } from './open-project'
import { findProject } from './projects.queries'
import { makeProject, readProject } from './projects.service'

/**
 * A copy of a project that whoever makes it leads: its own fields, gauges, lines and scenarios as they
 * stand. Members and files stay behind, for they were given to the other project; so do archived lines,
 * archived scenarios and histories.
 */
export function duplicateProject(
  work: ProjectWork,
  actor: SignedIn,
  projectId: string,
  name: string,
): Project {
  return change(work, actor, (deed) => {
    const { tx, by, at } = deed
    const from = findProject(tx, projectId)
    if (!from) throw noProject(projectId)
    const { site, client, datum, timeZone, note } = from
    const id = makeProject(deed, { name, site, client, datum, timeZone, note })
    for (const gauge of listGauges(tx, projectId)) {
      const { name, zero, correction, note } = gauge
      makeGauge(deed, id, { name, zero, correction, note })
    }
    for (const line of listLineIds(tx, projectId)) {
      copyLine(deed, { projectId, lineId: line.id }, { projectId: id, name: line.name })
    }
    recordAudit(tx, by, at, {
      action: 'project.duplicated',
      subjectType: 'project',
      subjectId: id,
      subjectName: name,
      projectId: id,
      toVersion: 1,
      detail: { from: projectId },
    })
    return readProject(tx, actor, id)
  })
}
