import { writeFileSync } from 'node:fs'
import { currentVerification } from './read-verification'

writeFileSync('docs/verification.md', await currentVerification())
