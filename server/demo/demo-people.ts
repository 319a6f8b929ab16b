import type { AccountRole } from '../../shared/access/roles'

/** One password for all of them; shown on the sign-in page, and refused in production. */
export const DEMO_PASSWORD = 'high water at seven'

/** Organisations of the demonstration; all invented. */
export const DEMO_ORGANISATIONS = {
  firm: { id: 'demo-org-firm', name: 'Mill Lane Engineers' },
  checkers: { id: 'demo-org-checkers', name: 'Second Look Checking' },
  school: { id: 'demo-org-school', name: 'Crew School' },
  authority: { id: 'demo-org-authority', name: 'Ferry Quay Harbour Office' },
} as const

export interface DemoPerson {
  readonly id: string
  readonly email: string
  /** Roles instead of names: nobody real stands behind them. */
  readonly name: string
  /** What the person shows, for the sign-in page. */
  readonly what: string
  readonly organisationId: string
  readonly role: AccountRole
  readonly mayCheck: boolean
  readonly mayApprove: boolean
}

const { firm, checkers, school, authority } = DEMO_ORGANISATIONS
const neither = { mayCheck: false, mayApprove: false }

/** People of the demonstration by stable ids, which projects and sheets of the demo refer to. */
export const DEMO_PEOPLE = {
  engineerA: {
    id: 'demo-engineer-a',
    email: 'engineer.a@demo.invalid',
    name: 'Engineer A',
    what: 'Leads the demo project, draws its lines and scenarios',
    organisationId: firm.id,
    role: 'engineer',
    ...neither,
  },
  engineerB: {
    id: 'demo-engineer-b',
    email: 'engineer.b@demo.invalid',
    name: 'Engineer B',
    what: 'Works on the demo project of the same firm',
    organisationId: firm.id,
    role: 'engineer',
    ...neither,
  },
  approver: {
    id: 'demo-approver',
    email: 'approver@demo.invalid',
    name: 'Approver',
    what: 'An engineer of the firm who may approve',
    organisationId: firm.id,
    role: 'engineer',
    mayCheck: false,
    mayApprove: true,
  },
  checker: {
    id: 'demo-checker',
    email: 'checker@demo.invalid',
    name: 'Checker',
    what: 'Checks the sheets of others, from another organisation',
    organisationId: checkers.id,
    role: 'checker',
    mayCheck: true,
    mayApprove: true,
  },
  trainer: {
    id: 'demo-trainer',
    email: 'trainer@demo.invalid',
    name: 'Trainer',
    what: 'Runs classes with the demonstrator',
    organisationId: school.id,
    role: 'trainer',
    ...neither,
  },
  viewer: {
    id: 'demo-viewer',
    email: 'viewer@demo.invalid',
    name: 'Viewer at the authority',
    what: 'Reads the demo project and changes nothing',
    organisationId: authority.id,
    role: 'viewer',
    ...neither,
  },
  administrator: {
    id: 'demo-administrator',
    email: 'administrator@demo.invalid',
    name: 'Administrator',
    what: 'Looks after people, organisations, audit trail and mail; sees no project',
    organisationId: firm.id,
    role: 'admin',
    ...neither,
  },
} as const satisfies Record<string, DemoPerson>
