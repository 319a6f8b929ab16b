import sharp from 'sharp'
import { BARRIERS } from '../../shared/catalogue/barriers'
import { exampleSection } from '../../shared/verification/example-section'
import { checkSection } from '../../shared/checks/section-check'
import { parseSectionCase } from '../../shared/schemas/parse-section-case'
import { sheetSchema, type Sheet, type SheetInput } from '../../shared/schemas/sheet'
import type { SectionCaseInput } from '../../shared/schemas/section-case'
import { OFF_THE_GRAVEL_STATIONS } from './ferry-quay-lines'
import { LOW_ROAD_SCENARIOS } from './ferry-quay-scenarios'

/** Day on which the sheets of Ferry Quay are made. */
const DAY = '2031-03-04'

/** 0.13 m in an hour, the steepest of the forecast [m/s]. */
const RISE = 0.13 / 3600

const LETTERHEAD = {
  name: 'Firm A, consulting engineers',
  address: '1 Mill Lane, Ferry Quay · invented for demonstration',
  disclaimer:
    'This sheet was prepared for the client named on it and for the line described in it. Firm A accepts no liability to others.',
}

const PREPARED = {
  name: 'Engineer One',
  organisation: 'Firm A',
  registration: 'REG-1001',
  date: DAY,
}
const CHECKED = {
  name: 'Checker Two',
  organisation: 'Office B',
  registration: 'REG-2044',
  date: DAY,
}
const APPROVED = {
  name: 'Engineer Three',
  organisation: 'Firm A',
  registration: 'REG-1002',
  date: DAY,
}

const PROJECT = {
  name: 'Ferry Quay flood plan',
  client: 'Ferry Quay Town Council',
  site: 'Low road and slipway, Ferry Quay',
  documents: [{ label: 'Flood plan', number: 'FQ-FP-02' }],
}

const TUBE_070: SectionCaseInput['barrier'] = exampleSection().barrier

/** A picture as base64 from an SVG. */
async function picture(svg: string) {
  const png = await sharp(Buffer.from(svg)).png({ compressionLevel: 9 }).toBuffer()
  return { mediaType: 'image/png' as const, base64: png.toString('base64') }
}

function sheet(input: Omit<SheetInput, 'result' | 'case'>, drawn: SectionCaseInput): Sheet {
  const section = parseSectionCase(drawn)
  return sheetSchema.parse({ ...input, case: section, result: checkSection(section) })
}

const LOGO = `<svg xmlns="http://www.w3.org/2000/svg" width="240" height="240" viewBox="0 0 24 24">
<circle cx="14.5" cy="9.5" r="6" fill="none" stroke="#6b3f63" stroke-width="2"/>
<path d="M2 17h11" stroke="#1b2a33" stroke-width="3"/><path d="M13 17h9" stroke="#1b2a33" stroke-width="1.2"/></svg>`

const SITE = (
  bank: string,
  river: string,
) => `<svg xmlns="http://www.w3.org/2000/svg" width="900" height="600" viewBox="0 0 90 60">
<rect width="90" height="60" fill="#dfe6e6"/><path d="M0 26q22-7 45-3t45-2v39H0z" fill="${bank}"/>
<path d="M0 40q25-5 48-1t42 2v19H0z" fill="${river}"/><path d="M8 38q30-6 74 3" fill="none" stroke="#6b3f63" stroke-width="2.4"/></svg>`

/** Words of the approved sheet; figures come from the engine. */
const LOW_ROAD_WORDS = {
  project: PROJECT,
  number: 'FQ-001',
  revision: 'B',
  revisionReason: 'Tube 1.00 m instead of 0.70 m after the forecast of 21:45',
  status: 'approved',
  category: 2,
  purpose: 'Check of the tube laid on Low road against the expected crest, for the flood plan.',
  place: 'Low road, chainage 70 to 90',
  datum: 'QD',
  groundLevel: 2.87,
  barrier: 'Example tube',
  surface: 'firm mown turf',
  restsOn: 'Forecast of the lock, issued 3 March 2031, 21:45: 3.42 QD, band 3.30 to 3.54',
  leave: { rateOfRise: RISE, timeToClear: 1200 },
  conditions: [
    'the gully at chainage 95 is plugged',
    'both ends tie into ground at 3.52\u00a0m\u00a0QD or higher',
  ],
  assumptions: [
    {
      text: 'Both closures at the turn of chainage 60 are fitted and tight.',
      isToBeConfirmed: true,
    },
  ],
  inputSources: {
    waterLevel: 'forecast of 21:45',
    groundLevel: 'survey of Low road, station 70',
    'ground.permeability': 'trial pit, silty clay',
  },
  people: { prepared: PREPARED, checked: CHECKED, approved: APPROVED },
  verification: { code: '7Q4K-19XM-3TRP', address: 'https://toehold.example/verify' },
  date: DAY,
  software: 'Toehold 0.1.0',
} satisfies Partial<SheetInput>

/** Low road as laid, approved, with the chapter of the line and photographs. */
async function lowRoad(): Promise<Sheet> {
  const scenario = LOW_ROAD_SCENARIOS.find(({ key }) => key === 'edges-weighed')
  const { id: _, statedHeight: _s, isExample: _e, ...barrier } = BARRIERS[2]!
  if (!scenario) throw new Error('the layout with weighed edges is missing')
  const stations = [...OFF_THE_GRAVEL_STATIONS]
  const sketches = [
    ['Low road at chainage 60, seen from the slipway (sketch)', '#8ba37f', '#7aa5b3'],
    ['Tie-in at the bank, chainage 180 (sketch)', '#9a8a70', '#86aebb'],
  ] as const
  const photographs = await Promise.all(
    sketches.map(async ([caption, bank, river]) => ({
      caption,
      picture: await picture(SITE(bank, river)),
    })),
  )
  const line = { name: 'Low road', stations, sectionLength: 10, content: scenario.content }
  const letterhead = { ...LETTERHEAD, logo: await picture(LOGO) }
  return sheet(
    { ...LOW_ROAD_WORDS, line, photographs, letterhead },
    {
      barrier,
      ground: { friction: 0.45, permeability: 1e-5, layerThickness: 2 },
      water: { depth: 0.55 },
    },
  )
}

/** US units and US Letter, with current, waves and debris, not checked. */
function slipway(): Sheet {
  return sheet(
    {
      project: PROJECT,
      number: 'FQ-005',
      revisionReason: 'First issue',
      status: 'issued-for-information',
      category: 1,
      purpose: 'What a current and small waves along the slipway would change; for information.',
      place: 'Slipway, chainage 40 to 50',
      surface: 'concrete slab',
      barrier: 'Example tube',
      leave: { rateOfRise: RISE, timeToClear: 1800 },
      people: { prepared: PREPARED },
      letterhead: LETTERHEAD,
      verification: { code: '9D2H-KM7W-4XCE', address: 'https://toehold.example/verify' },
      date: DAY,
      software: 'Toehold 0.1.0',
      units: 'us',
      paper: 'us-letter',
    },
    {
      barrier: { ...TUBE_070, fabricStrength: 60_000 },
      ground: { friction: 0.4, fall: 0.02 },
      uplift: { edgeFactor: 0.5 },
      water: { depth: 0.4, dryDepth: 0.03, currentSpeed: 0.6, waveHeight: 0.04, wavePeriod: 1.5 },
      debris: { force: 400 },
      basis: 'unusual',
    },
  )
}

/** A draft on partial factors, with uplift that grows. */
function carPark(): Sheet {
  return sheet(
    {
      project: PROJECT,
      number: 'FQ-006',
      status: 'draft',
      category: 3,
      purpose: 'Would the 0.70 m tube do on the car park if the ground stays tight for a day?',
      place: 'Car park, chainage 120 to 150',
      datum: 'QD',
      groundLevel: 2.97,
      surface: 'asphalt',
      people: { prepared: PREPARED },
      conditions: ['the gravel strip is passed 3 m landward, on asphalt'],
      date: DAY,
      software: 'Toehold 0.1.0',
    },
    {
      barrier: { ...TUBE_070, fabricStrength: 60_000 },
      ground: { friction: 0.5 },
      uplift: { model: 'developing', diffusivity: 1e-5, time: 43_200 },
      water: { depth: 0.45 },
      basis: 'partial-ec7',
    },
  )
}

/** Three sheets of Ferry Quay, all invented, by the names of their files. */
export async function sampleSheets(): Promise<ReadonlyMap<string, Sheet>> {
  return new Map([
    ['approved', await lowRoad()],
    ['for-information-us-letter', slipway()],
    ['draft-partial-factors', carPark()],
  ])
}
