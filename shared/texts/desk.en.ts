/** Texts of the desk. */
export const deskTexts = {
  title: 'Desk',
  what: 'the desk',
  projects: 'My projects',
  all: 'All projects',
  waiting: 'Sheets that wait for me',
  wait: {
    check: 'To check',
    approve: 'To approve',
    submit: 'Returned to me',
  },
  waitingSince: '{place} · {project}, since {at}',
  changes: 'What changed',
  noChanges: 'Nothing has changed yet.',
  counts: '{lines} lines, {scenarios} scenarios',
  updated: 'changed {at} by {by}',
  empty: 'Make the first project',
  emptyText:
    'A project holds the site, its gauges, the lines to be defended and the scenarios that are checked on them.',
  emptyMember: 'You are in no project yet',
  emptyMemberText:
    'Whoever leads a project can add you by your address. The Quick check is open to you now.',
  quickCheck: 'To the Quick check',
  change: '{who} {did}',
  crumbs: 'Where you are',
} as const
