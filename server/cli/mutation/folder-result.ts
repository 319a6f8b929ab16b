/** The part of the standard mutation report that is read. */
export interface MutationReport {
  readonly files: Readonly<Record<string, ReportedFile>>
}

interface ReportedFile {
  readonly source: string
  readonly mutants: readonly ReportedMutant[]
}

interface ReportedMutant {
  readonly mutatorName: string
  readonly replacement?: string
  readonly status: string
  readonly location: { readonly start: Place; readonly end: Place }
}

interface Place {
  readonly line: number
  readonly column: number
}

/** A mutant that no test noticed, and why that is so. */
export interface Survivor {
  readonly file: string
  readonly line: number
  readonly from: string
  readonly to: string
  /** Empty until somebody has looked at it. */
  readonly reason: string
}

export interface FolderResult {
  readonly measured: string
  /** Tests that ran, as a pattern of their paths; left out: all of the engine. */
  readonly tests?: string
  /** Noticed by a failing test, or by one that never ended. */
  readonly killed: number
  readonly survived: number
  readonly survivors: readonly Survivor[]
}

/** docs/mutation.json. */
export interface MutationResults {
  readonly tool: string
  readonly folders: Readonly<Record<string, FolderResult>>
}

interface Measurement {
  readonly folder: string
  readonly measured: string
  /** The result before, whose reasons are carried over. */
  readonly before: FolderResult | undefined
  readonly tests?: string | undefined
}

const KILLED = ['Killed', 'Timeout']
const SURVIVED = ['Survived', 'NoCoverage']

/** Figures of one folder from a report; whatever did not compile or was left out counts nowhere. */
export function folderResult(report: MutationReport, of: Measurement): FolderResult {
  const mutants = Object.entries(report.files)
    .filter(([path]) => path.startsWith(`shared/${of.folder}/`))
    .flatMap(([path, file]) => file.mutants.map((mutant) => ({ path, file, mutant })))
  const countOf = (statuses: readonly string[]) =>
    mutants.filter(({ mutant }) => statuses.includes(mutant.status)).length
  const survivors = mutants
    .filter(({ mutant }) => SURVIVED.includes(mutant.status))
    .map(({ path, file, mutant }) => survivorOf(path, file, mutant))
    .map((survivor) => ({ ...survivor, reason: reasonBefore(survivor, of.before) }))
  return {
    measured: of.measured,
    ...(of.tests ? { tests: of.tests } : {}),
    killed: countOf(KILLED),
    survived: survivors.length,
    survivors,
  }
}

/**
 * The report without what survived, so that it runs again: the tool keeps a survivor although there
 * are new tests.
 */
export function withoutSurvivors<Report extends MutationReport>(report: Report): Report {
  const files = Object.entries(report.files).map(([path, file]) => {
    const mutants = file.mutants.filter(({ status }) => !SURVIVED.includes(status))
    return [path, { ...file, mutants }] as const
  })
  return { ...report, files: Object.fromEntries(files) }
}

function survivorOf(path: string, file: ReportedFile, mutant: ReportedMutant): Survivor {
  const { start, end } = mutant.location
  const lines = file.source.split('\n').slice(start.line - 1, end.line)
  const last = lines.length - 1
  lines[last] = lines[last]!.slice(0, end.column - 1)
  lines[0] = lines[0]!.slice(start.column - 1)
  const from = oneLine(lines.join(' '))
  const to = oneLine(mutant.replacement ?? mutant.mutatorName)
  return { file: path.replace(/^shared\//, ''), line: start.line, from, to, reason: '' }
}

/** Long mutants are cut: the place says which it is. */
function oneLine(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim()
  return line.length > 70 ? `${line.slice(0, 69)}…` : line
}

function reasonBefore(survivor: Survivor, before: FolderResult | undefined): string {
  const same = before?.survivors.find(
    ({ file, from, to }) => file === survivor.file && from === survivor.from && to === survivor.to,
  )
  return same?.reason ?? ''
}
