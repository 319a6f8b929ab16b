import { BackupError } from '../backup/backup-error'
import { restoreBackup } from '../backup/restore-backup'
import { readPlaces, runCommand } from './read-places'

const USAGE = [
  'npm run restore -- FILE [--force]    puts a backup in the place of database and files',
  '  --force    put aside what is there',
].join('\n')

await runCommand(async () => {
  const words = process.argv.slice(2)
  const [archive, ...rest] = words.filter((word) => word !== '--force')
  if (archive === undefined || archive.startsWith('-') || rest.length > 0) {
    throw new BackupError(USAGE)
  }
  const target = { ...readPlaces(), at: Date.now(), isForced: words.includes('--force') }
  const { manifest, putAside } = await restoreBackup(archive, target)
  const lines = [
    `Restored the backup of ${manifest.createdAt}: the database and ` +
      `${manifest.entries.length - 1} files.`,
    ...putAside.map((path) => `What was there lies in ${path}`),
  ]
  return lines.join('\n')
})
