import type { DeletionBar } from '../projects/put-away-project.service'
import { countIssued } from './sheets.queries'

/** Whoever holds a sheet must be able to verify it, so a project with issued sheets stays. */
export const issuedSheetsBar: DeletionBar = (db, projectId) => {
  const issued = countIssued(db, projectId)
  if (issued === 0) return null
  const what = issued === 1 ? 'a sheet was issued' : `${issued} sheets were issued`
  return `This project is not deleted: ${what} from it, and whoever holds one must be able to verify it.`
}
