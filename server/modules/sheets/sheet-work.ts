import { randomBytes } from 'node:crypto'
import type { KeyedHash } from '../../auth/keyed-hash'
import type { FileStore } from '../../files/file-store'
import type { MailWay } from '../../mail/mail-queue'
import type { ProjectWork } from '../projects/deed'

/** What the services of sheets work with. */
export interface SheetWork extends ProjectWork {
  readonly store: FileStore
  readonly mail: MailWay
  /** Address at which people reach the program. */
  readonly appUrl: string
  readonly keyedHash: KeyedHash
  /** Name and version of the program, as sheets print it. */
  readonly software: string
}

export interface SheetPlace {
  readonly projectId: string
  readonly sheetId: string
}

/** Random bytes for a verification code. */
export const codeBytes = () => randomBytes(12)
