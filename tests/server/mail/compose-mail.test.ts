import { describe, expect, it } from 'vitest'
import { composeMail, type MailKind } from '../../../server/mail/compose-mail'
import { mailTexts } from '../../../shared/texts/mail.en'

const appUrl = 'https://toehold.example'
const link = `${appUrl}/invite/abc`
const values = {
  name: 'Engineer A',
  inviter: 'Administrator',
  role: 'engineer',
  organisation: 'Mill Lane Engineers',
  expires: '2031-03-03 21:45 UTC',
  changed: '2031-03-03 21:45 UTC',
  sheet: 'FQ-001 rev A',
  project: 'Ferry Quay',
  by: 'Checker',
  reason: 'The friction has no source',
}

describe('a mail', () => {
  it.each(Object.keys(mailTexts) as MailKind[])('of kind %s leaves no gap unfilled', (kind) => {
    const { subject, text, html } = composeMail(kind, { appUrl, link, values })
    expect(subject + text + html).not.toMatch(/\{\w+\}|undefined/)
    expect(text).toContain(appUrl)
  })

  it('carries its link in text and HTML', () => {
    const { text, html } = composeMail('invitation', { appUrl, link, values })
    expect(text).toContain(`Accept the invitation:\n${link}\n`)
    expect(html).toContain(`<a href="${link}"`)
  })

  it('shows markup in a name as text', () => {
    const name = '<img src=x onerror="alert(1)"> & \'Co\''
    const { html } = composeMail('invitation', { appUrl, link, values: { ...values, name } })
    expect(html).not.toContain('<img')
    expect(html).toContain('&lt;img src=x onerror=&quot;alert(1)&quot;&gt; &amp; &#39;Co&#39;')
  })

  it('gives no name a line of its own, nor another gap to fill', () => {
    const name = 'A\r\nBcc: x@people.test {inviter}'
    const { text } = composeMail('invitation', { appUrl, link, values: { ...values, name } })
    expect(text).toContain('Hello A Bcc: x@people.test {inviter},')
  })
})
