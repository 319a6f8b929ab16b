import { minimumAirPressure } from '../calc/air/minimum-air-pressure'
import { sectionGeometry } from '../calc/section/section-geometry'
import { waterAllowance } from '../checks/freeboard-check'
import { leaveLevel, type LeaveLevel } from '../checks/leave-level'
import type { Sheet } from '../schemas/sheet'
import type { SheetDocument, ShownVerdict } from './document'
import type { SheetWords } from './sheet-words'

/** A verdict with its word. */
export function shownVerdict(words: SheetWords, id: ShownVerdict['id']): ShownVerdict {
  return { id, word: words.say(`checks.verdict.${id}`) }
}

/** Leave level of a sheet. */
export function leaveOf({ result, leave, case: section }: Sheet): LeaveLevel {
  const { from, depth } = result.holdsTo
  return leaveLevel({
    holdsToDepth: depth,
    holdsFrom: from,
    depth: section.water.depth,
    ...leave,
  })
}

/** What stands on the first page. */
export function coverOf(sheet: Sheet, words: SheetWords): SheetDocument['cover'] {
  const { result } = sheet
  const lead = result.verdict === 'fails' ? 'leadFails' : 'leadHolds'
  const holdsSomewhere = result.holdsTo.from !== null
  return {
    verdict: shownVerdict(words, result.verdict),
    answer: answerOf(sheet, words),
    subject: subjectOf(sheet, words),
    leave: leaveWords(sheet, words),
    conditionsLead: holdsSomewhere ? words.say(`sheet.condition.${lead}`) : '',
    conditions: holdsSomewhere ? conditionsOf(sheet, words) : [],
    facts: factsOf(sheet, words),
    purpose: sheet.purpose,
  }
}

/** The answer in one sentence, with level and datum where the ground level is known. */
export function answerOf(sheet: Sheet, words: SheetWords): string {
  const { result, groundLevel, case: section } = sheet
  const { from, depth, check } = result.holdsTo
  const then = words.say(`checks.then.${check}`)
  if (from === null) return words.say('sheet.answer.none', { then })
  const form = groundLevel === null ? 'AsDepth' : 'AsLevel'
  const values = {
    depth: words.show(depth, 'length', 'down'),
    level: groundLevel === null ? '' : words.level(groundLevel + depth, 'down'),
    from: words.show(from, 'length', 'up'),
    then,
  }
  const isInside = section.water.depth <= depth && section.water.depth >= from
  if (isInside) return words.say(`sheet.answer.holds${form}`, values)
  return words.say(from > 0 ? `sheet.answer.from${form}` : `sheet.answer.only${form}`, values)
}

function subjectOf(sheet: Sheet, words: SheetWords): string {
  const { case: section, barrier, surface, groundLevel } = sheet
  const { say, show, level, size } = words
  const values = {
    name: barrier,
    barrier: size(section.barrier.diameter),
    skirt: size(section.barrier.skirtLength),
    air: show(section.barrier.airPressure, 'pressure'),
  }
  const tube =
    barrier === ''
      ? say('sheet.subject.tube', { ...values, barrier: `Tube ${values.barrier}` })
      : say('sheet.subject.named', values)
  const ground = groundLevel === null ? '' : level(groundLevel)
  const place =
    surface !== '' && ground !== ''
      ? say('sheet.subject.onSurface', { surface, ground })
      : surface !== ''
        ? say('sheet.subject.onSurfaceOnly', { surface })
        : ground !== ''
          ? say('sheet.subject.atGround', { ground })
          : ''
  const depth = show(section.water.depth, 'length')
  const water =
    groundLevel === null
      ? say('sheet.subject.waterDepth', { depth })
      : say('sheet.subject.waterLevel', { level: level(groundLevel + section.water.depth), depth })
  return `${[tube, place].filter((part) => part !== '').join(', ')}. ${water}`
}

function leaveWords(sheet: Sheet, words: SheetWords): string {
  const { depth, state } = leaveOf(sheet)
  const { groundLevel } = sheet
  if (depth === null) return words.say('sheet.leave.none')
  if (depth <= 0 && groundLevel === null) return words.say('sheet.leave.dry')
  const form = groundLevel === null ? 'AsDepth' : 'AsLevel'
  const key =
    state === 'leave-before-level' ? `sheet.leave.must${form}` : `sheet.leave.leave${form}`
  return words.say(key, {
    depth: words.show(depth, 'length', 'down'),
    level: groundLevel === null ? '' : words.level(groundLevel + depth, 'down'),
  })
}

function conditionsOf(sheet: Sheet, words: SheetWords): readonly string[] {
  const { case: section, conditions } = sheet
  const { say, show } = words
  const { uplift, water, debris } = section
  const air = leastAir(sheet)
  const edge =
    uplift.model === 'none'
      ? say('sheet.condition.sealed')
      : uplift.edgeFactor < 1
        ? say('sheet.condition.edge', { share: show(uplift.edgeFactor, 'percent') })
        : say('sheet.condition.edgeOpen')
  const isStill = water.currentSpeed === 0 && water.waveHeight === 0 && debris.force === 0
  return [
    say('sheet.condition.friction', { friction: show(section.ground.friction, 'ratio') }),
    ...(air === null ? [] : [say('sheet.condition.air', { air: show(air, 'pressure', 'up') })]),
    edge,
    ...(water.dryDepth > 0
      ? [say('sheet.condition.dry', { depth: show(water.dryDepth, 'length') })]
      : []),
    say(isStill ? 'sheet.condition.still' : 'sheet.condition.loads'),
    ...conditions,
  ]
}

/** Least air pressure at the level to which the section holds, or at its own if it is lower. */
function leastAir({ case: section, result }: Sheet): number | null {
  const depth = Math.min(section.water.depth, result.holdsTo.depth)
  const at = { ...section, water: { ...section.water, depth } }
  const { wettedSkirt, unitWeight } = sectionGeometry(at)
  if (section.barrier.skirtLength === 0 || depth === 0) return null
  const { least } = minimumAirPressure({
    diameter: section.barrier.diameter,
    wettedSkirt,
    depth,
    unitWeight,
    freeboard: section.requiredFreeboard + waterAllowance({ section: at }),
  })
  return least
}

function factsOf(sheet: Sheet, words: SheetWords): SheetDocument['cover']['facts'] {
  const { say } = words
  const { project, status, category, revisionReason, restsOn, case: section } = sheet
  const fact = (name: string, value: string) => ({ label: say(`sheet.fact.${name}`), value })
  return [
    fact('client', project.client),
    fact('site', project.site),
    ...project.documents.map(({ label, number }) => ({ label, value: number })),
    fact('status', say(`sheet.status.${status}`)),
    fact('category', say(`sheet.category.${category}`)),
    fact('basis', say(`checks.basis.${section.basis.replace('.', '-')}`)),
    fact('reason', revisionReason),
    fact('restsOn', restsOn),
  ].filter(({ value }) => value !== '')
}
