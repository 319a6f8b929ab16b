import { ref, shallowRef } from 'vue'
import { decodeText, MOST_BYTES, type DecodedText, type FileFault } from '@/survey/decode-text'

/** A file that somebody chose: its text, or why it has none. */
export function useSurveyFile(whenRead: (read: DecodedText) => void) {
  const name = ref('')
  const size = ref(0)
  const decoded = shallowRef<DecodedText | null>(null)
  const fault = ref<FileFault | 'unreadable' | null>(null)
  /** The newest file counts: an older one that takes longer to read is dropped. */
  let turn = 0

  async function open(file: File): Promise<void> {
    turn += 1
    const mine = turn
    name.value = file.name
    size.value = file.size
    decoded.value = null
    fault.value = file.size > MOST_BYTES ? 'too-large' : null
    if (fault.value) return
    const bytes = await file.arrayBuffer().catch(() => null)
    if (mine !== turn) return
    const read = bytes ? decodeText(new Uint8Array(bytes)) : ('unreadable' as const)
    if (typeof read === 'string') {
      fault.value = read
      return
    }
    decoded.value = read
    whenRead(read)
  }

  return { name, size, decoded, fault, open }
}
