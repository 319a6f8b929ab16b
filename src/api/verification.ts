import type { VerifiedFile, VerifiedSheet } from '@shared/schemas/verification'
import { getJson, sendForm } from './request'

const PATH = '/api/verify'

export async function fetchVerified(code: string): Promise<VerifiedSheet> {
  return (await getJson(`${PATH}/${encodeURIComponent(code)}`)) as VerifiedSheet
}

export async function verifyFile(file: File): Promise<VerifiedFile> {
  const form = new FormData()
  form.append('file', file)
  return (await sendForm('POST', PATH, form)) as VerifiedFile
}

/** Address of a page of an issued sheet as a picture. */
export function verifiedPage(code: string, page: number): string {
  return `${PATH}/${encodeURIComponent(code)}/pages/${page}`
}
