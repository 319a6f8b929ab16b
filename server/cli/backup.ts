import { BackupError } from '../backup/backup-error'
import { createBackup } from '../backup/create-backup'
import { readPlaces, runCommand } from './read-places'

const USAGE =
  'npm run backup -- FILE    writes database and files into one archive, FILE.tar.gz say'

await runCommand(async () => {
  const [archive, ...rest] = process.argv.slice(2)
  if (archive === undefined || archive.startsWith('-') || rest.length > 0) {
    throw new BackupError(USAGE)
  }
  const { entries } = await createBackup({ ...readPlaces(), at: Date.now() }, archive)
  return `${archive}: the database and ${entries.length - 1} files, each with its checksum`
})
