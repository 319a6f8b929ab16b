import { parentPort } from 'node:worker_threads'
import { answerTasks } from '../threads/answer-tasks'
import { sheetTasks } from './sheet-tasks'

// What the thread of the sheets runs.
answerTasks(parentPort!, sheetTasks())
