import { useWords } from './useWords'

/** Entries of a detail that name other rows; the CSV file has them. */
const FOR_MACHINES = ['handOverTo', 'invitation', 'lineId', 'mediaType', 'seed', 'sha256']

/** An id names a row, not a thing that a reader knows. */
const ID = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/** What the audit trail holds, in words: deeds and their details. */
export function useDeedWords() {
  const { t } = useWords()

  /** "saved the scenario" for `scenario.saved`; an action without words of its own is spelt out. */
  function deed(action: string): string {
    const [subject, verb] = action.split('.')
    const key = `deeds.did.${subject}.${verb}`
    const words = t(key)
    return words === key ? spelt(action) : words
  }

  /** "role: viewer to engineer", "sessions: 2". */
  function details(detail: Readonly<Record<string, unknown>>): string[] {
    return Object.entries(detail)
      .filter(([name, value]) => isForReaders(name, value))
      .map(([name, value]) => `${nameOf(name)}: ${shown(value)}`)
  }

  function nameOf(name: string): string {
    const key = `deeds.detail.${name}`
    const words = t(key)
    return words === key ? spelt(name) : words
  }

  function shown(value: unknown): string {
    if (Array.isArray(value)) return listed(value)
    if (typeof value === 'boolean') return t(value ? 'deeds.yes' : 'deeds.no')
    if (value === null || value === '') return t('deeds.none')
    if (typeof value !== 'object') return spelt(String(value))
    return 'from' in value && 'to' in value
      ? t('admin.audit.fromTo', { from: shown(value.from), to: shown(value.to) })
      : details({ ...value }).join(', ')
  }

  /** What is counted is the list of ids; what is named are the others. */
  function listed(values: readonly unknown[]): string {
    const ids = values.filter((value) => ID.test(String(value)))
    return ids.length > 0 ? String(ids.length) : values.map(shown).join(', ') || t('deeds.none')
  }

  return { deed, details }
}

function isForReaders(name: string, value: unknown): boolean {
  return !FOR_MACHINES.includes(name) && !ID.test(String(value)) && value !== 0
}

/** "waterLevel" and "does-not-hold" as words. */
function spelt(name: string): string {
  return name
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .replace(/(?<=[a-z])[.-](?=[a-z])/g, ' ')
    .replace(/ [A-Z](?=[a-z])/g, (start) => start.toLowerCase())
}
