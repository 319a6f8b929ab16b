import type { BasisId } from '@shared/catalogue/check-bases'

/** Text key of a check basis; a dot in its name would be read as a step into the texts. */
export function basisKey(id: BasisId): string {
  return `checks.basis.${id.replace('.', '-')}`
}
