import { createI18n, type MessageContext } from 'vue-i18n'
import { texts } from '@shared/texts'

/**
 * Texts are plain with `{name}` placeholders, exactly as the files and PDFs read them, so the
 * message compiler of the library stays out of the bundle.
 */
function compileMessage(message: unknown) {
  const template = String(message)
  if (!template.includes('{')) return () => template
  return (context: MessageContext) =>
    template.replace(/\{(\w+)\}/g, (_, name: string) => String(context.named(name)))
}

/** Texts in English; another language is one more entry of `texts`. */
export function createTexts() {
  return createI18n({
    legacy: false,
    locale: 'en',
    fallbackLocale: 'en',
    messages: texts,
    messageCompiler: compileMessage,
  })
}

/** Texts that come with an area of the program when it is entered. */
export type AreaTexts = Readonly<Record<keyof typeof texts, object>>

/** Adds the texts of an area; adding them again changes nothing. */
export function addTexts({ global }: ReturnType<typeof createTexts>, area: AreaTexts): void {
  for (const [locale, messages] of Object.entries(area)) {
    global.mergeLocaleMessage(locale as keyof typeof texts, messages)
  }
}
