import { addMemberSchema, memberParamsSchema, updateMemberSchema } from '../../../shared/api/members.ts'
import { defineRoute, noInput } from '../../http/routeTable.ts'
import { addMember, changeMember } from './changeMember.ts'
import { listMembers } from './memberRepo.ts'

export const memberRoutes = [
  defineRoute({
    method: 'get',
    path: '/api/members',
    action: 'member.read',
    params: noInput,
    query: noInput,
    body: noInput,
    handle: async ({ db, member }) => ({ members: await listMembers(db, member.companyId) }),
  }),
  defineRoute({
    method: 'post',
    path: '/api/members',
    action: 'member.manage',
    params: noInput,
    query: noInput,
    body: addMemberSchema,
    handle: (context, { body }) => addMember(context, body),
  }),
  defineRoute({
    method: 'patch',
    path: '/api/members/:memberId',
    action: 'member.manage',
    params: memberParamsSchema,
    query: noInput,
    body: updateMemberSchema,
    handle: (context, { params, body }) => changeMember(context, params.memberId, body),
  }),
]
