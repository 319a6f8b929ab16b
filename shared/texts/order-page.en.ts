/** Texts of the page of an order and of the foot of its paper; both read them by name, not by key. */
export const orderPageTexts = {
  word: {
    page: 'Page',
    pageOf: 'of',
    scan: 'Scan it for the page: tick off what is done, works without signal once opened.',
  },
  notice: {
    expired: 'This order ran out at {time}. Do not work by it. Ask for a new one.',
    replaced: 'Replaced by order {number} at {time}. Do not work by this one.',
    withdrawn: 'Withdrawn at {time}: {reason}. Do not work by it.',
    open: 'Open order {number}',
  },
  tick: {
    done: 'done {time}',
    waiting: 'not sent yet',
    progress: '{done} of {all} done',
  },
  page: {
    online: 'Connected',
    offline: 'No signal: ticks stay on this phone and are sent later',
    kept: 'Kept on this phone',
    notKept: 'Not kept: needs signal to open again',
    pdf: 'Paper form (PDF)',
    lost: 'Not sent: {count}',
    contents: 'Parts of the order',
    jump: { plug: 'Plug', lay: 'Lay', leave: 'Leave', round: 'Round' },
    unknownTitle: 'No such order',
    unknown: 'There is no order at this address. Check every sign, or scan the code again.',
    slow: 'Too many wrong addresses from here. Wait a little and try again.',
  },
} as const
