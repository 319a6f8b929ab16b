import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type {
  Gauge,
  gaugeChangeSchema,
  gaugesSchema,
  newGaugeSchema,
} from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import { change, type Deed, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import { assertVersion, changedFields, openProject } from '../projects/open-project'
import { deleteGauge, findGauge, insertGauge, listGauges, updateGauge } from './gauges.queries'

export interface GaugePlace {
  readonly projectId: string
  readonly gaugeId: string
}

type NewGauge = z.output<typeof newGaugeSchema>

export function readGauges(db: Db, projectId: string): z.output<typeof gaugesSchema> {
  return { gauges: listGauges(db, projectId) }
}

export function createGauge(
  work: ProjectWork,
  actor: Doer,
  projectId: string,
  input: NewGauge,
): Gauge {
  return change(work, actor, (deed) => {
    openProject(deed.tx, projectId)
    const gaugeId = makeGauge(deed, projectId, input)
    noteChange(deed, projectId, {
      ...subject({ id: gaugeId, name: input.name }),
      action: 'gauge.created',
      toVersion: 1,
    })
    return gaugeAt(deed.tx, { projectId, gaugeId })
  })
}

/** A gauge without its line in the audit trail, for whoever makes more than one. */
export function makeGauge(
  { tx, by, at }: Deed,
  projectId: string,
  input: NewGauge,
  id = randomUUID() as string,
): string {
  const { accountId } = by
  const kept = { createdAt: at, createdBy: accountId, updatedAt: at, updatedBy: accountId }
  insertGauge(tx, { id, projectId, ...input, ...kept })
  return id
}

/** @throws ConflictError for an older version, or while the project is archived. */
export function changeGauge(
  work: ProjectWork,
  actor: Doer,
  place: GaugePlace,
  { version, ...input }: z.output<typeof gaugeChangeSchema>,
): Gauge {
  return change(work, actor, (deed) => {
    const { tx, by, at } = deed
    openProject(tx, place.projectId)
    const before = gaugeAt(tx, place)
    assertVersion(before, version)
    updateGauge(tx, place.gaugeId, {
      ...input,
      version: version + 1,
      updatedAt: at,
      updatedBy: by.accountId,
    })
    const { zero, correction } = before
    noteChange(deed, place.projectId, {
      ...subject({ id: before.id, name: input.name ?? before.name }),
      action: 'gauge.changed',
      fromVersion: version,
      toVersion: version + 1,
      detail: { fields: changedFields(before, input), before: { zero, correction } },
    })
    return gaugeAt(tx, place)
  })
}

/** The audit trail keeps its figures. */
export function removeGauge(work: ProjectWork, actor: Doer, place: GaugePlace): void {
  change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const before = gaugeAt(deed.tx, place)
    deleteGauge(deed.tx, place.gaugeId)
    const { zero, correction, note } = before
    noteChange(deed, place.projectId, {
      ...subject(before),
      action: 'gauge.deleted',
      fromVersion: before.version,
      detail: { zero, correction, note },
    })
  })
}

/** @throws NotFoundError for a gauge that is not in the project. */
export function gaugeAt(db: Db, { projectId, gaugeId }: GaugePlace): Gauge {
  const gauge = findGauge(db, projectId, gaugeId)
  if (!gauge) throw new NotFoundError(`gauge: "${gaugeId}" does not exist in this project`)
  return gauge
}

const subject = ({ id, name }: Pick<Gauge, 'id' | 'name'>) => ({
  subjectType: 'gauge',
  subjectId: id,
  subjectName: name,
})
