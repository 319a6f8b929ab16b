/** One mail: what stands before and after the button, and on it. */
export interface MailTexts {
  readonly subject: string
  readonly before: readonly string[]
  /** Words on the link; left out where there is none. */
  readonly action?: string
  readonly after: readonly string[]
}

/** Every mail that the program sends; `{name}` is filled in. */
export const mailTexts = {
  invitation: {
    subject: 'You are invited to Toehold',
    before: [
      'Hello {name},',
      '{inviter} invites you to Toehold, the workbench for temporary flood barriers, as {role} of {organisation}.',
    ],
    action: 'Accept the invitation',
    after: [
      'The link works once, until {expires}.',
      'If you did not expect this, do nothing: without the link there is no account.',
    ],
  },
  passwordReset: {
    subject: 'Choose a new password for Toehold',
    before: ['Hello {name},', 'Somebody asked for a new password for your account at Toehold.'],
    action: 'Choose a new password',
    after: [
      'The link works once, until {expires}. It ends all your open sessions.',
      'If it was not you, do nothing: your password stays as it is.',
    ],
  },
  passwordChanged: {
    subject: 'Your password at Toehold was changed',
    before: [
      'Hello {name},',
      'The password of your account at Toehold was changed at {changed}. Other sessions were ended.',
    ],
    after: [
      'If it was not you, ask for a new password on the sign-in page, and tell your administrator.',
    ],
  },
  sheetReview: {
    subject: 'Sheet {sheet} waits for a check',
    before: ['Hello {name},', '{by} asks for a check of sheet {sheet} of the project {project}.'],
    action: 'Open the sheet',
    after: ['You get this because you may check sheets of this project.'],
  },
  sheetChecked: {
    subject: 'Sheet {sheet} waits for approval',
    before: ['Hello {name},', '{by} checked sheet {sheet} of the project {project}.'],
    action: 'Open the sheet',
    after: ['You get this because you may approve sheets of this project.'],
  },
  sheetReturned: {
    subject: 'Sheet {sheet} was returned',
    before: [
      'Hello {name},',
      '{by} returned sheet {sheet} of the project {project}. The reason: {reason}',
    ],
    action: 'Open the sheet',
    after: ['Answer the comments, change what has to be changed, and submit it again.'],
  },
  sheetApproved: {
    subject: 'Sheet {sheet} was approved',
    before: [
      'Hello {name},',
      'The approval of sheet {sheet} of the project {project} by {by} was recorded.',
    ],
    action: 'Open the sheet',
    after: [
      'Its PDF and figures are frozen. Anyone can verify it by its code, without an account.',
    ],
  },
  sheetSuperseded: {
    subject: 'Sheet {sheet} was superseded',
    before: [
      'Hello {name},',
      'Sheet {sheet} of the project {project} was superseded by its next revision. Do not use it any longer.',
    ],
    action: 'See what is current',
    after: [],
  },
} as const satisfies Record<string, MailTexts>

/** Words that fill the mails where a name or a value is missing. */
export const mailWords = {
  anonymous: 'there',
  administration: 'The administration',
  signature: 'Toehold · {address}',
  roles: {
    admin: 'administrator',
    engineer: 'engineer',
    checker: 'checking engineer',
    trainer: 'trainer',
    viewer: 'viewer',
  },
} as const

/** Heads of the columns of the audit trail as CSV. */
export const auditColumns = [
  'Number',
  'When (UTC)',
  'Who',
  'Action',
  'Kind',
  'Subject',
  'Subject id',
  'Project id',
  'From version',
  'To version',
  'Detail',
] as const
