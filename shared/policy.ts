/** The five roles of a company's members, from most to least say over the company. */
export const roles = ['owner', 'office', 'designer', 'lead', 'technician'] as const
export type Role = (typeof roles)[number]

/** Everything the product can be asked to do. Routes and changes both name one of these. */
export const actions = [
  'session.read',
  'session.update',
  'company.read',
  'company.update',
  'member.read',
  'member.manage',
  'catalog.read',
  'catalog.update',
  'job.read',
  'job.create',
  'job.command',
  'job.design',
  'job.settings',
  'job.record',
  'job.export',
  'label.print',
  'finding.accept',
] as const
export type Action = (typeof actions)[number]

/**
 * Who may do what: the only statement of rights in the product. The server enforces it for each route and for
 * each change; the client reads the same table to grey out what would be refused.
 * 'job.command' opens the one door for edits; what an edit touches is then judged by the action of each kind.
 */
export const policy: Record<Action, Record<Role, boolean>> = {
  'session.read': { owner: true, office: true, designer: true, lead: true, technician: true },
  'session.update': { owner: true, office: true, designer: true, lead: true, technician: true },
  'company.read': { owner: true, office: true, designer: true, lead: true, technician: true },
  'company.update': { owner: true, office: true, designer: false, lead: false, technician: false },
  'member.read': { owner: true, office: true, designer: true, lead: true, technician: false },
  'member.manage': { owner: true, office: false, designer: false, lead: false, technician: false },
  'catalog.read': { owner: true, office: true, designer: true, lead: true, technician: true },
  'catalog.update': { owner: true, office: true, designer: true, lead: false, technician: false },
  'job.read': { owner: true, office: true, designer: true, lead: true, technician: true },
  'job.create': { owner: true, office: true, designer: true, lead: false, technician: false },
  'job.command': { owner: true, office: true, designer: true, lead: true, technician: true },
  'job.design': { owner: true, office: false, designer: true, lead: false, technician: false },
  'job.settings': { owner: true, office: true, designer: true, lead: false, technician: false },
  'job.record': { owner: true, office: false, designer: true, lead: true, technician: true },
  'job.export': { owner: true, office: true, designer: true, lead: true, technician: true },
  'label.print': { owner: true, office: true, designer: true, lead: true, technician: true },
  'finding.accept': { owner: true, office: false, designer: true, lead: false, technician: false },
}

/** Whether a role may do an action. */
export const can = (role: Role, action: Action): boolean => policy[action][role]

/** The actions a role has, for the client to grey out the rest. */
export const actionsOf = (role: Role): Action[] => actions.filter((action) => can(role, action))
