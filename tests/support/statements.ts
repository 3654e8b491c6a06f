/** Tables whose rows belong to a company, out of the statements that were run on them. */
const touched = (statement: string) =>
  [...statement.matchAll(/\b(?:from|into|update|join)\s+`(\w+)`/gi)].map((match) => match[1]!)

/** Signing in finds the company by the address; it is the only read that cannot know the company before. */
const findsTheCompany = /^select .* from `members` where `members`\.`email` = \?$/i

/**
 * Statements on a company's tables that do not say which company: for an insert its columns, for any other its
 * condition must name company_id.
 */
export function unscoped(statements: readonly string[], companyTables: ReadonlySet<string>): string[] {
  return statements.filter((statement) => {
    if (!touched(statement).some((table) => companyTables.has(table)) || findsTheCompany.test(statement)) return false
    const decisive = /^insert/i.test(statement) ? statement : (statement.split(/\bwhere\b/i)[1] ?? '')
    return !decisive.includes('`company_id`')
  })
}
