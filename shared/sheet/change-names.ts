import type { FigureKind } from '../derivation/sheet-units'
import { CHECK_IDS } from '../schemas/check-ids'

type WordsOf = (value: string) => string

const BASIS: WordsOf = (value) => `checks.basis.${value}`
const UPLIFT: WordsOf = (value) => `checks.upliftModel.${value}`
const VERDICT: WordsOf = (value) => `checks.verdict.${value}`
const CHECK: WordsOf = (value) => `checks.name.${value}`
const YES_NO: WordsOf = (value) => `sheet.change.yesNo.${value}`
const SHAPE: WordsOf = (value) => `sheet.change.shapeReason.${value}`

/** How a changed field is called, and what its figure is; null: a word. */
export interface ChangeName {
  /** Keys of the texts that make its name, one after the other. */
  readonly keys: readonly string[]
  readonly kind: FigureKind | 'percent' | null
  /** Key of the word of a value. */
  readonly words?: WordsOf
}

const given = (symbol: string, kind: FigureKind): ChangeName => ({
  keys: [`derivation.given.${symbol}`],
  kind,
})
const line = (id: string, kind: FigureKind): ChangeName => ({
  keys: [`derivation.line.${id}`],
  kind,
})
const own = (id: string, kind: ChangeName['kind'] = null, words?: WordsOf): ChangeName => ({
  keys: [`sheet.change.${id}`],
  kind,
  ...(words ? { words } : {}),
})

/** Inputs of a case and of a place, by their paths. */
const INPUTS: Readonly<Record<string, ChangeName>> = {
  groundLevel: given('Z_g', 'length'),
  gripShare: given('s_g', 'ratio'),
  'leave.rateOfRise': given('c_r', 'rate'),
  'leave.timeToClear': given('t_c', 'minutes'),
  'case.gravity': given('g', 'acceleration'),
  'case.basis': own('basis', null, BASIS),
  'case.requiredFreeboard': given('f_r', 'length'),
  'case.barrier.diameter': given('D', 'length'),
  'case.barrier.skirtLength': given('L', 'length'),
  'case.barrier.contactWidth': given('b', 'length'),
  'case.barrier.mass': given('m', 'massPerLength'),
  'case.barrier.airPressure': given('p', 'pressure'),
  'case.barrier.sectionLength': given('ell_s', 'length'),
  'case.barrier.fabricStrength': given('S_t', 'forcePerLength'),
  'case.ground.friction': given('mu', 'ratio'),
  'case.ground.fall': given('t_f', 'ratio'),
  'case.ground.permeability': given('k_g', 'speed'),
  'case.ground.layerThickness': given('T_l', 'length'),
  'case.ground.undrainedStrength': given('c_u', 'pressure'),
  'case.ground.suitable': own('suitable', null, YES_NO),
  'case.uplift.model': own('upliftModel', null, UPLIFT),
  'case.uplift.edgeFactor': given('eta', 'ratio'),
  'case.uplift.diffusivity': given('c_v', 'flowPerLength'),
  'case.uplift.time': given('t_u', 'seconds'),
  'case.water.depth': given('h', 'length'),
  'case.water.dryDepth': given('h_d', 'length'),
  'case.water.density': given('rho', 'density'),
  'case.water.currentSpeed': given('V', 'speed'),
  'case.water.dragCoefficient': given('C_d', 'ratio'),
  'case.water.waveHeight': given('H_s', 'length'),
  'case.water.wavePeriod': given('T_w', 'seconds'),
  'case.debris.force': given('P_d', 'force'),
}

function ofChecks(): Readonly<Record<string, ChangeName>> {
  const kinds = { factor: 'ratio', required: 'ratio', utilisation: 'percent' } as const
  const rows = CHECK_IDS.flatMap((id) => {
    const name = `checks.name.${id}`
    const figures = Object.entries(kinds).map(([field, kind]): [string, ChangeName] => {
      const isHeight = id === 'freeboard' && field === 'required'
      const shown = isHeight ? 'length' : kind
      return [`result.${id}.${field}`, { keys: [name, `sheet.change.${field}`], kind: shown }]
    })
    const verdict: ChangeName = {
      keys: [name, 'sheet.change.verdict'],
      kind: null,
      words: VERDICT,
    }
    return [...figures, [`result.${id}.verdict`, verdict] as [string, ChangeName]]
  })
  return Object.fromEntries(rows)
}

/** Results, by their paths. */
const RESULTS: Readonly<Record<string, ChangeName>> = {
  'result.verdict': own('wholeVerdict', null, VERDICT),
  'result.governs': own('governs', null, CHECK),
  'result.holdsTo.from': own('holdsFrom', 'length'),
  'result.holdsTo.depth': line('holdsTo', 'length'),
  'result.holdsTo.check': own('limitedBy', null, CHECK),
  ...ofChecks(),
  'result.freeboard.available': line('freeboard', 'length'),
  'result.thrust.still': line('stillThrust', 'forcePerLength'),
  'result.thrust.current': line('currentThrust', 'forcePerLength'),
  'result.thrust.wave': line('waveThrust', 'forcePerLength'),
  'result.thrust.debris': line('debrisThrust', 'forcePerLength'),
  'result.thrust.dry': line('dryThrust', 'forcePerLength'),
  'result.thrust.total': line('totalThrust', 'forcePerLength'),
  'result.thrust.arm': line('arm', 'length'),
  'result.vertical.waterOnSkirt': line('waterOnSkirt', 'forcePerLength'),
  'result.vertical.lift': line('lift', 'forcePerLength'),
  'result.vertical.dryLift': line('liftDry', 'forcePerLength'),
  'result.vertical.self': line('selfWeight', 'forcePerLength'),
  'result.vertical.uplift': line('uplift', 'forcePerLength'),
  'result.vertical.net': line('net', 'forcePerLength'),
  'result.overturningGross': line('grossRatio', 'ratio'),
  'result.resultant.x': own('resultantPlace', 'length'),
  'result.resultant.share': own('resultantShare', 'percent'),
  'result.loadedShape.solved': own('solved', null, YES_NO),
  'result.loadedShape.reason': own('unsolved', null, SHAPE),
  'result.loadedShape.crest': line('crest', 'length'),
  'result.loadedShape.contact': line('contact', 'length'),
  'result.loadedShape.skinTension': line('skinTension', 'forcePerLength'),
  'result.loadedShape.skirtTension': line('skirtTension', 'forcePerLength'),
  'result.loadedShape.weldHeight': line('weldHeight', 'length'),
  'result.loadedShape.freeSkirt': line('freeSkirt', 'length'),
  'result.loadedShape.skirtGrip': line('skirtGrip', 'forcePerLength'),
  'result.anchoringMassPerSection': line('anchoringMass', 'mass'),
  'result.justEnough.skirtLength': own('enoughSkirt', 'length'),
  'result.justEnough.friction': own('enoughFriction', 'ratio'),
  'result.justEnough.edgeFactor': own('enoughEdge', 'percent'),
  'result.seepage.perMetre': line('seepage', 'flowPerLength'),
}

/** Words of a sheet; what stands in a list is one field. */
const WORDS: Readonly<Record<string, ChangeName>> = {
  number: own('number'),
  revision: own('revision'),
  revisionReason: own('revisionReason'),
  place: own('title'),
  project: own('project'),
  category: own('category'),
  purpose: own('purpose'),
  datum: own('datum'),
  barrier: own('barrier'),
  surface: own('surface'),
  restsOn: own('restsOn'),
  conditions: own('conditions'),
  assumptions: own('assumptions'),
  inputSources: own('inputSources'),
  line: own('line'),
  bends: own('bends'),
  checking: own('checking'),
  software: own('software'),
  units: own('units'),
  paper: own('paper'),
  format: own('format'),
}

export type ChangePart = 'inputs' | 'results' | 'words'

/** The name of a changed field and the part it belongs to; null: no name is known. */
export function changeName(
  path: string,
): { readonly id: string; readonly part: ChangePart; readonly name: ChangeName } | null {
  const input = INPUTS[path]
  if (input) return { id: path, part: 'inputs', name: input }
  const result = RESULTS[path]
  if (result) return { id: path, part: 'results', name: result }
  const [id = ''] = path.split('.')
  const words = WORDS[id]
  return words ? { id, part: 'words', name: words } : null
}
