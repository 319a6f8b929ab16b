import { ACCOUNT_ROLES, MEMBER_ROLES, type AccountRole } from '../../shared/access/roles'
import { ACCESS_RULES, decideAccess, type RuleId } from '../../shared/access/rules'
import { type Operation, openapiPath } from './operation'

const HEAD = `# Who may what

Made by \`npm run docs:access\` from \`shared/access/rules.ts\` and the routes of the server; a test fails
when it is out of date. A route names its rule, and nothing else decides on access. Services add what
depends on content: the preparer of a sheet never checks it, the last administrator stays one.

An account has one role; _may check_ and _may approve_ come on top, and a checker has both. In a project
an account is \`lead\`, \`editor\` or \`reader\`, or no member; membership alone gives access, and a viewer
is never more than a reader. Whoever is no member is told that a project does not exist.
`

/** The table of rules, and every route with its rule, as Markdown. */
export function accessDocument(operations: readonly Operation[]): string {
  return [HEAD, '## Rules', rulesTable(), '## Routes', routesTable(operations)].join('\n')
}

function rulesTable(): string {
  const rows = (Object.keys(ACCESS_RULES) as RuleId[]).map((rule) => [
    `\`${rule}\``,
    ...[null, ...ACCOUNT_ROLES].map((role) => whoMay(rule, role)),
    ACCESS_RULES[rule].meaning,
  ])
  return table(['rule', 'nobody', ...ACCOUNT_ROLES, 'in words'], rows)
}

/** "yes", "no", or the member roles with which the account role may. */
function whoMay(rule: RuleId, role: AccountRole | null): string {
  const may = (member: (typeof MEMBER_ROLES)[number] | null) =>
    decideAccess(rule, role && { role }, member) === 'allowed'
  const members = MEMBER_ROLES.filter(may)
  if (may(null)) return 'yes'
  return members.length === 0 ? 'no' : `as ${members.join(', ')}`
}

function routesTable(operations: readonly Operation[]): string {
  const rows = [...operations]
    .sort((a, b) => Number(a.path > b.path) - Number(a.path < b.path))
    .map(({ method, path, rule, summary }) => [
      `\`${method.toUpperCase()} ${openapiPath(path)}\``,
      `\`${rule}\``,
      summary,
    ])
  return table(['route', 'rule', 'what it does'], rows)
}

function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |`
  return `\n${[line(head), line(head.map(() => '---')), ...rows.map(line)].join('\n')}\n`
}
