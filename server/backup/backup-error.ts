/** A backup or a restore cannot be done; the message says why, and what to do. */
export class BackupError extends Error {
  override readonly name = 'BackupError'
}
