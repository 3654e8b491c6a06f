import { updateCompanySchema, type CompanyAnswer } from '../../../shared/api/company.ts'
import { AppError } from '../../../shared/errors.ts'
import { defineRoute, noInput, type MemberContext } from '../../http/routeTable.ts'
import { readCompany, writeCompany } from './companyRepo.ts'

export const companyRoutes = [
  defineRoute({
    method: 'get',
    path: '/api/company',
    action: 'company.read',
    params: noInput,
    query: noInput,
    body: noInput,
    handle: (context) => companyOf(context),
  }),
  defineRoute({
    method: 'patch',
    path: '/api/company',
    action: 'company.update',
    params: noInput,
    query: noInput,
    body: updateCompanySchema,
    handle: async (context, { body }) => {
      const { version, ...given } = body
      const set = Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined))
      if (!(await writeCompany(context.db, context.member.companyId, version, set)))
        throw new AppError('conflict', 'Somebody else has changed the company’s settings since you opened them', {
          current: await companyOf(context),
          mine: set,
        })
      return companyOf(context)
    },
  }),
]

async function companyOf({ db, member }: MemberContext): Promise<CompanyAnswer> {
  const company = await readCompany(db, member.companyId)
  if (!company) throw new AppError('not_found', 'There is nothing at this address')
  return company
}
