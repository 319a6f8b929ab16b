import type { Message, TextValues } from '../../texts/format-text'
import type { Label } from '../label-placer'
import type { Composition } from '../cross-section/composition'
import type { TextRole } from '../scene'

/** A message of the demonstrator's drawings. */
export function demoText(name: string, values?: TextValues): Message {
  const key = `demonstrator.draw.${name}`
  return values ? { key, values } : { key }
}

/** A label in the large type of the picture. */
export function largeLabel(
  { frame }: Composition,
  id: string,
  role: TextRole,
  message: Message,
): Label {
  return { id, role, message, size: frame.layout.font, weight: 600 }
}

/** A label in its smaller type. */
export function smallLabel(
  { frame }: Composition,
  id: string,
  role: TextRole,
  message: Message,
): Label {
  return { id, role, message, size: frame.layout.small }
}
