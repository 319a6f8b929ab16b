import { describe, expect, it } from 'vitest'
import { demoAccountsSchema } from '../../../shared/schemas/account'
import { DEMO_PEOPLE } from '../../../server/demo/demo-people'
import { updateAccount } from '../../../server/modules/accounts/accounts.queries'
import {
  demoPeopleSeed,
  usableDemoAccounts,
} from '../../../server/modules/accounts/demo-accounts.service'
import { browser, signedIn } from '../../support/people'
import { CHEAP_PASSWORDS, freshApp, SECRET } from '../../support/server-app'

const demoSeeds = [demoPeopleSeed(CHEAP_PASSWORDS)]
const production = {
  NODE_ENV: 'production',
  APP_URL: 'http://localhost:3000',
  SESSION_SECRET: SECRET,
}

describe('demo accounts', () => {
  it('are listed with a password by which each of them signs in', async () => {
    const { app } = freshApp({ demoSeeds })
    const { body } = await browser(app).get('/api/demo-accounts').expect(200)
    const { accounts } = demoAccountsSchema.parse(body)
    expect(accounts).toHaveLength(7)
    for (const { email, password, name } of accounts) {
      expect(email).toMatch(/@demo\.invalid$/)
      const agent = await signedIn(app, { email }, password)
      expect((await agent.get('/api/session')).body.account.name).toBe(name)
    }
  })

  it('are the people of the story: two of one firm, others elsewhere', () => {
    const { engineerA, engineerB, approver, checker, trainer, viewer } = DEMO_PEOPLE
    expect(engineerB.organisationId).toBe(engineerA.organisationId)
    expect(approver).toMatchObject({ organisationId: engineerA.organisationId, mayApprove: true })
    for (const { organisationId } of [checker, trainer, viewer]) {
      expect(organisationId).not.toBe(engineerA.organisationId)
    }
  })

  it('leave the list when they are deactivated', async () => {
    const { app, db } = freshApp({ demoSeeds })
    updateAccount(db, DEMO_PEOPLE.trainer.id, { deactivatedAt: 1 })
    const { body } = await browser(app).get('/api/demo-accounts').expect(200)
    expect(body.accounts).toHaveLength(6)
    expect(usableDemoAccounts(db)).not.toContain(DEMO_PEOPLE.trainer.name)
  })

  it('do not exist in production', async () => {
    const { app, db } = freshApp({ demoSeeds, environment: production })
    await browser(app).get('/api/demo-accounts').expect(404)
    expect(usableDemoAccounts(db)).toEqual([])
  })
})
