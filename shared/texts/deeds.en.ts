/**
 * What the audit trail calls a deed, by its action: "account.signed-in" is `did.account.signed-in`.
 * Whoever did it stands before the words, and what it was done to after them.
 */
export const deedsTexts = {
  did: {
    account: {
      changed: 'changed their own account',
      'password-changed': 'changed their password',
      'session-ended': 'ended a session',
      'sign-in-slowed': 'had to wait before signing in',
      'signed-in': 'signed in',
      'signed-out-everywhere': 'signed out everywhere',
    },
    depot: {
      changed: 'changed the depot',
      created: 'added the depot',
      removed: 'removed the depot',
    },
    file: { added: 'added the file', changed: 'changed the file', deleted: 'deleted the file' },
    gauge: {
      changed: 'changed the gauge',
      created: 'made the gauge',
      deleted: 'removed the gauge',
    },
    invitation: {
      accepted: 'accepted the invitation',
      printed: 'printed the link for the first administrator',
      revoked: 'revoked the invitation',
      sent: 'invited somebody',
    },
    line: {
      archived: 'archived the line',
      changed: 'changed the line',
      created: 'made the line',
      duplicated: 'copied the line',
      restored: 'restored the line',
    },
    mail: { read: 'read the mail', retried: 'sent the mail again' },
    member: {
      added: 'added the member',
      left: 'left the project',
      removed: 'removed the member',
      'role-changed': 'changed the role of the member',
    },
    organisation: { created: 'added the organisation', renamed: 'renamed the organisation' },
    'password-reset': { requested: 'asked for a new password', used: 'chose a new password' },
    person: {
      'address-erased': 'erased the address of',
      changed: 'changed the person',
      deactivated: 'deactivated the person',
    },
    project: {
      archived: 'archived the project',
      changed: 'changed the project',
      created: 'made the project',
      deleted: 'deleted the project for good',
      duplicated: 'copied the project',
      'handed-over': 'handed over the project',
      restored: 'restored the project',
    },
    scenario: {
      archived: 'archived the scenario',
      created: 'made the scenario',
      duplicated: 'copied the scenario',
      restored: 'restored the scenario',
      saved: 'saved the scenario',
      'version-restored': 'brought back a version of the scenario',
    },
  },
  /** Names in the detail of an entry. */
  detail: {
    changed: 'other answers',
    failedBefore: 'wrong passwords before',
    failures: 'wrong passwords',
    fields: 'changed',
    holdsToLevel: 'holds to level',
    mayApprove: 'may approve',
    mayCheck: 'may check',
    recomputed: 'computed again',
    restored: 'version brought back',
  },
  yes: 'yes',
  no: 'no',
  none: 'none',
} as const
