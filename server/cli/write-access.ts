import { writeFileSync } from 'node:fs'
import { format } from 'prettier'
import { IN_MEMORY, openDatabase } from '../db/client'
import { readEnv } from '../env'
import { accessDocument } from '../http/access-document'
import { allOperations } from '../operations'
import { createParts } from '../parts'

const FILE = 'docs/access.md'

/** Routes are described without being called, so that an empty database is enough. */
const { db, close } = openDatabase(IN_MEMORY)
const operations = allOperations(createParts(db, readEnv({})), {
  version: '',
  mode: 'demonstration',
})
writeFileSync(FILE, await format(accessDocument(operations), { parser: 'markdown' }))
close()
