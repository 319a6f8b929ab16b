/** A case that holds: tube 0.70 m on turf with 0.42 m of water, open edge. */
export const holdingCase = {
  command: 'section',
  barrier: {
    diameter: 0.7,
    skirtLength: 2.2,
    contactWidth: 0.12,
    mass: 4.8,
    airPressure: 15_000,
    sectionLength: 10,
    fabricStrength: 60_000,
  },
  ground: { friction: 0.45 },
  uplift: { model: 'linear', edgeFactor: 1 },
  water: { depth: 0.42 },
}

/** A group of the case with a change in it, as JSON text: a test may put in what JSON lacks. */
export function caseText(group: keyof typeof holdingCase, field: string, json: string): string {
  const mark = '"@"'
  const before = holdingCase[group] as Record<string, unknown>
  const changed = { ...holdingCase, [group]: { ...before, [field]: '@' } }
  return JSON.stringify(changed).replace(mark, json)
}

export interface BadInput {
  readonly what: string
  readonly text: string
  readonly status: 400 | 422
  readonly path: string
  /** The value as the answer shows it. */
  readonly value: unknown
  readonly message: string
}

const without = (group: 'barrier' | 'water', field: string) => {
  const rest = Object.entries(holdingCase[group]).filter(([name]) => name !== field)
  return JSON.stringify({ ...holdingCase, [group]: Object.fromEntries(rest) })
}

/** Everything that people get wrong, with the one answer that form, API and batch command give. */
export const BAD_INPUTS: readonly BadInput[] = [
  {
    what: 'a depth above 1.5 diameters',
    text: caseText('water', 'depth', '1.06'),
    status: 422,
    path: 'water.depth',
    value: 1.06,
    message: 'water.depth: 1.06 is not allowed; it must be 0 to 1.05 m',
  },
  {
    what: 'a negative length',
    text: caseText('barrier', 'skirtLength', '-2.2'),
    status: 422,
    path: 'barrier.skirtLength',
    value: -2.2,
    message: 'barrier.skirtLength: -2.2 is not allowed; it must be 0 to 15 m',
  },
  {
    what: 'a friction of 5',
    text: caseText('ground', 'friction', '5'),
    status: 422,
    path: 'ground.friction',
    value: 5,
    message: 'ground.friction: 5 is not allowed; it must be above 0 to 1.5',
  },
  {
    what: 'millimetres typed as metres',
    text: caseText('barrier', 'diameter', '700'),
    status: 422,
    path: 'barrier.diameter',
    value: 700,
    message: 'barrier.diameter: 700 is not allowed; it must be 0.2 to 3 m',
  },
  {
    what: 'waves without a period',
    text: caseText('water', 'waveHeight', '0.2'),
    status: 422,
    path: 'water.wavePeriod',
    value: null,
    message:
      'water.wavePeriod: nothing is not allowed; it must be 0.5 to 20 s (required with waves)',
  },
  {
    what: 'an empty field',
    text: without('water', 'depth'),
    status: 400,
    path: 'water.depth',
    value: null,
    message: 'water.depth: nothing is not allowed; it must be a number, 0 to 1.05 m',
  },
  {
    what: 'null where a number is required',
    text: caseText('barrier', 'mass', 'null'),
    status: 400,
    path: 'barrier.mass',
    value: null,
    message: 'barrier.mass: nothing is not allowed; it must be a number, 0 to 500 kg/m',
  },
  {
    what: 'a text in a number',
    text: caseText('water', 'depth', '"0,42"'),
    status: 400,
    path: 'water.depth',
    value: '0,42',
    message: 'water.depth: "0,42" is not allowed; it must be a number, 0 to 1.05 m',
  },
  {
    what: 'NaN, which JSON does not have',
    text: caseText('barrier', 'airPressure', 'NaN'),
    status: 400,
    path: 'barrier.airPressure',
    value: 'NaN',
    message: 'barrier.airPressure: NaN is not allowed; it must be a number, 1 to 100000 Pa',
  },
  {
    what: '1e309, which no number reaches',
    text: caseText('water', 'depth', '1e309'),
    status: 400,
    path: 'water.depth',
    value: 'Infinity',
    message: 'water.depth: Infinity is not allowed; it must be a number, 0 to 1.05 m',
  },
  {
    what: 'a name that is not on the list',
    text: caseText('uplift', 'model', '"quadratic"'),
    status: 400,
    path: 'uplift.model',
    value: 'quadratic',
    message:
      'uplift.model: "quadratic" is not allowed; it must be one of none, linear, deep, developing',
  },
  {
    what: 'a case of another command',
    text: JSON.stringify({ ...holdingCase, command: 'duty' }),
    status: 400,
    path: 'command',
    value: 'duty',
    message: 'command: "duty" is not allowed; it must be one of section',
  },
]
