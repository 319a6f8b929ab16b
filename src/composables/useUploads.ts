import { shallowReadonly, shallowRef } from 'vue'
import { uploadFile } from '@/api/files'
import { ApiError } from '@/api/request'

/** One file on its way. */
export interface Upload {
  readonly key: number
  readonly file: File
  /** Share that is sent, 0 to 1. */
  readonly share: number
  /** Why it was not taken; null while it is on its way. */
  readonly problem: ApiError | null
}

/** Sends files one after another; one that is refused stays, to be tried again or left out. */
export function useUploads(projectId: () => string, whenTaken: () => void) {
  const uploads = shallowRef<readonly Upload[]>([])
  let nextKey = 0
  let line: Promise<void> = Promise.resolve()

  function set(key: number, change: Partial<Upload>): void {
    uploads.value = uploads.value.map((one) => (one.key === key ? { ...one, ...change } : one))
  }

  function dismiss(key: number): void {
    uploads.value = uploads.value.filter((one) => one.key !== key)
  }

  async function send({ key, file }: Upload): Promise<void> {
    try {
      await uploadFile(projectId(), file, (share) => set(key, { share }))
      dismiss(key)
      whenTaken()
    } catch (error) {
      if (!(error instanceof ApiError)) throw error
      set(key, { problem: error })
    }
  }

  function queue(upload: Upload): void {
    line = line.then(() => send(upload))
  }

  function add(files: Iterable<File>): void {
    for (const file of files) {
      const upload = { key: (nextKey += 1), file, share: 0, problem: null }
      uploads.value = [...uploads.value, upload]
      queue(upload)
    }
  }

  function retry(upload: Upload): void {
    set(upload.key, { share: 0, problem: null })
    queue(upload)
  }

  return { uploads: shallowReadonly(uploads), add, retry, dismiss }
}
