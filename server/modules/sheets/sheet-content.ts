import type { z } from 'zod'
import type { newSheetSchema } from '../../../shared/schemas/sheet-api'
import { sheetSchema, type Sheet, type Signatory } from '../../../shared/schemas/sheet'
import { scenarioPart, sourceWords } from '../../../shared/sheet/scenario-sheet'
import type { Db } from '../../db/client'
import { parseInput } from '../../http/parse-input'
import { findShownAccount } from '../accounts/accounts.queries'
import { lineAt } from '../lines/open-line'
import { findProject } from '../projects/projects.queries'
import { letterheadOf } from '../organisations/letterheads.service'
import { scenarioAt } from '../scenarios/open-scenario'

type NewSheet = z.output<typeof newSheetSchema>
type Source = Pick<NewSheet, 'lineId' | 'scenarioId' | 'place'>

/** The part of a sheet that a scenario gives, and which state of it that was. */
export interface Sourced {
  readonly part: Partial<Sheet>
  readonly columns: {
    readonly lineId: string
    readonly scenarioId: string
    readonly scenarioVersion: number
    readonly place: number
  }
}

/**
 * Reads a scenario for a sheet; all figures are computed here.
 *
 * @throws NotFoundError; OutOfRangeError where nothing can be computed at the place.
 */
export function sourced(db: Db, projectId: string, { lineId, scenarioId, place }: Source): Sourced {
  const line = lineAt(db, { projectId, lineId })
  const scenario = scenarioAt(db, { projectId, lineId, scenarioId })
  const chainage = place ?? scenario.content.place
  const { version: scenarioVersion } = scenario
  return {
    part: {
      ...scenarioPart(line, scenario.content, chainage),
      ...sourceWords(line.name, chainage, scenario),
    },
    columns: { lineId, scenarioId, scenarioVersion, place: chainage },
  }
}

/** "Quay datum (QD)" is written QD behind a level. */
export function shortDatum(datum: string): string {
  return /\(([^()]{1,20})\)\s*$/.exec(datum)?.[1] ?? datum
}

/** A day in the time zone of a project, `YYYY-MM-DD`. */
export function dayIn(timeZone: string, at: number): string {
  return new Intl.DateTimeFormat('en-CA', { timeZone, dateStyle: 'short' }).format(at)
}

/** Somebody who puts their name to a sheet now, with their organisation of today. */
export function signatory(db: Db, accountId: string, date: string): Signatory {
  const account = findShownAccount(db, accountId)!
  const { name, organisation, registrationNumber } = account
  return { name, organisation: organisation.name, registration: registrationNumber, date }
}

export interface Author {
  readonly accountId: string
  readonly software: string
  readonly at: number
}

/** The content of a new draft. */
export function draftContent(
  db: Db,
  projectId: string,
  { lineId: _l, scenarioId: _s, place: _p, ...words }: NewSheet,
  { part, number, author }: { part: Partial<Sheet>; number: string; author: Author },
): Sheet {
  const { name, client, site, datum, timeZone } = findProject(db, projectId)!
  const { unitSystem, organisation } = findShownAccount(db, author.accountId)!
  return parseInput(sheetSchema, {
    project: { name, client, site },
    number,
    ...words,
    ...part,
    datum: shortDatum(datum),
    letterhead: letterheadOf(db, organisation.id),
    date: dayIn(timeZone, author.at),
    software: author.software,
    units: unitSystem,
  })
}
