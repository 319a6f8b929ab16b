import { eq } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { accounts } from '../../../../server/db/schema'
import { DEMO_PEOPLE } from '../../../../server/demo/demo-people'
import { problemSchema } from '../../../../shared/schemas/problem'
import { membersSchema } from '../../../../shared/schemas/project'
import { auditOf } from '../../../support/audit-trail'
import { addMember, as, projectServer, startedProject } from '../../../support/project-server'

const { engineerA, engineerB, viewer, checker } = DEMO_PEOPLE

async function started() {
  const server = projectServer()
  const { lead, projectPath } = await startedProject(server)
  const path = `${projectPath}/members`
  return { server, lead, projectPath, path }
}

describe('members', { timeout: 30_000 }, () => {
  it('are added by address, whatever its capitals, and see the project from then on', async () => {
    const { server, lead, projectPath, path } = await started()
    await as(server, 'engineerB').get(projectPath).expect(404)
    const body = { email: ' Engineer.B@Demo.Invalid ', role: 'editor' }
    await lead.post(path, body).expect(201)
    await as(server, 'engineerB').get(projectPath).expect(200)
    const { members } = membersSchema.parse((await lead.get(path)).body)
    expect(members.map(({ name, role, isActive }) => [name, role, isActive])).toEqual([
      ['Engineer A', 'lead', true],
      ['Engineer B', 'editor', true],
    ])
    await lead.post(path, body).expect(409)
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'member.added',
      subjectName: 'Engineer B',
      detail: { role: 'editor' },
    })
  })

  it('need an active account: unknown and closed ones are answered alike', async () => {
    const { server, lead, path } = await started()
    const { db } = server
    db.update(accounts).set({ deactivatedAt: 1 }).where(eq(accounts.id, checker.id)).run()
    const answers = []
    for (const email of ['nobody@demo.invalid', checker.email]) {
      const { body } = await lead.post(path, { email, role: 'reader' }).expect(422)
      const problem = problemSchema.parse(body)
      expect(problem.fields).toHaveLength(1)
      expect(problem.fields[0]).toMatchObject({ path: 'email', value: email })
      answers.push(problem.message.replace(email, '…'))
    }
    expect(answers[0]).toBe(answers[1])
  })

  it('with a viewer account are readers and nothing else', async () => {
    const { lead, path } = await started()
    const { body } = await lead.post(path, { email: viewer.email, role: 'editor' }).expect(422)
    expect(problemSchema.parse(body).fields[0]).toMatchObject({ path: 'role', value: 'editor' })
    await lead.post(path, { email: viewer.email, role: 'reader' }).expect(201)
    await lead.patch(`${path}/${viewer.id}`, { role: 'lead' }).expect(422)
  })

  it('change roles, and are removed', async () => {
    const { server, lead, projectPath, path } = await started()
    await addMember(server, projectPath, 'engineerB', 'reader')
    const changed = await lead.patch(`${path}/${engineerB.id}`, { role: 'lead' }).expect(200)
    expect(changed.body).toMatchObject({ role: 'lead' })
    await as(server, 'engineerB').patch(`${path}/${engineerA.id}`, { role: 'reader' }).expect(200)
    await lead.delete(`${path}/${engineerB.id}`).expect(403)
    await as(server, 'engineerB').delete(`${path}/${engineerA.id}`).expect(204)
    await lead.get(projectPath).expect(404)
    await as(server, 'engineerB').delete(`${path}/${engineerA.id}`).expect(404)
    expect(auditOf(server.db).slice(-2)).toMatchObject([
      { action: 'member.role-changed', detail: { from: 'lead', to: 'reader' } },
      { action: 'member.removed', detail: { role: 'reader' } },
    ])
  })

  it('leave by themselves, readers too, and no longer see the project', async () => {
    const { server, lead, projectPath } = await started()
    const own = `${projectPath}/membership`
    for (const role of ['editor', 'reader'] as const) {
      await addMember(server, projectPath, 'engineerB', role)
      await as(server, 'engineerB').delete(own).expect(204)
      await as(server, 'engineerB').get(projectPath).expect(404)
      await as(server, 'engineerB').delete(own).expect(404)
      expect(auditOf(server.db).at(-1)).toMatchObject({
        action: 'member.left',
        actorName: 'Engineer B',
        subjectName: 'Engineer B',
        detail: { role },
      })
    }
    const { body } = await lead.delete(own).expect(409)
    expect(problemSchema.parse(body).message).toContain('Engineer A is the only lead')
    await addMember(server, projectPath, 'engineerB', 'lead')
    await lead.delete(own).expect(204)
  })

  it('always include a lead who can sign in', async () => {
    const { server, lead, projectPath, path } = await started()
    const mine = `${path}/${engineerA.id}`
    const refusal = await lead.patch(mine, { role: 'editor' }).expect(409)
    expect(problemSchema.parse(refusal.body).message).toContain('Engineer A is the only lead')
    await lead.delete(mine).expect(409)
    await addMember(server, projectPath, 'engineerB', 'lead')
    const closed = server.db.update(accounts).set({ deactivatedAt: 1 })
    closed.where(eq(accounts.id, engineerB.id)).run()
    await lead.delete(mine).expect(409)
    const opened = server.db.update(accounts).set({ deactivatedAt: null, role: 'viewer' })
    opened.where(eq(accounts.id, engineerB.id)).run()
    await lead.delete(mine).expect(409)
    server.db.update(accounts).set({ role: 'engineer' }).where(eq(accounts.id, engineerB.id)).run()
    await lead.delete(mine).expect(204)
  })
})
