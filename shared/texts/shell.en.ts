/** Texts of the frame: name, menu, banner, cautions, problems. */
export const shellTexts = {
  name: 'Toehold',
  windowTitle: '{page} · Toehold',
  skip: 'Skip to the page',
  menu: 'Places',
  desk: 'Desk',
  method: 'Method',
  demonstrator: 'Demonstrator',
  signIn: 'Sign in',
  signOut: 'Sign out',
  notSignedOut: 'Not signed out: the server did not answer. Try again.',
  person: 'Signed in as {name}',
  account: 'My account',
  admin: 'Administration',
  demonstration: 'Demonstration: everything stored here is invented.',
  units: { label: 'Units', metric: 'Metric', us: 'US' },
  theme: { label: 'Colours', light: 'Light', dark: 'Dark', system: 'System' },
  tip: { open: 'What is this: {term}' },
  close: 'Close',
  cautions: {
    guarantee: 'A design check, not a guarantee.',
    codes:
      'Local codes, the barrier’s own instructions and a licensed engineer’s judgement come first.',
    leave: 'Leave before the water reaches the leave level.',
    people: 'Nobody on the wet side, or close behind a loaded barrier without a way out.',
    ground: 'No set-up on loose gravel or bare mud.',
    power:
      'Electric pumps and blowers near water need earth-fault protection; fuel engines outdoors only.',
  },
  notFound: {
    title: 'Nothing here',
    text: 'This address leads nowhere. It may be mistyped, or the page was moved.',
    back: 'To the Quick check',
  },
} as const
