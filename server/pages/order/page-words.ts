import { orderPageTexts } from '../../../shared/texts/order-page.en'

const { tick, page, notice } = orderPageTexts

/** Words that the script of the page needs, by the names under which it asks for them. */
export const SCRIPT_WORDS: Readonly<Record<string, string>> = {
  done: tick.done,
  waiting: tick.waiting,
  progress: tick.progress,
  online: page.online,
  offline: page.offline,
  kept: page.kept,
  notKept: page.notKept,
  lost: page.lost,
  'notice.expired': notice.expired,
  'notice.replaced': notice.replaced,
  'notice.withdrawn': notice.withdrawn,
  'notice.open': notice.open,
}
