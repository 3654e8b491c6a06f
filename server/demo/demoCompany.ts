import { defaultLabelPattern } from '../../shared/labels/pattern.ts'
import type { WorkingRules } from '../../shared/model/job.ts'
import { defaultLimits } from '../../shared/model/limits.ts'
import type { Role } from '../../shared/policy.ts'
import { feetToMm } from '../../shared/units.ts'

/** Invented people of invented companies. One passphrase for all: it is for looking round, not for use. */
export const demoPassphrase = 'studs are open today'

export interface DemoMember {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly role: Role
}

export interface DemoCompany {
  readonly id: string
  readonly name: string
  readonly rules: WorkingRules
  readonly members: readonly DemoMember[]
}

const rules: WorkingRules = {
  lengthUnit: 'ft',
  conductorUnit: 'awg',
  labelPattern: defaultLabelPattern,
  slackRackMm: feetToMm(7),
  slackPlateMm: feetToMm(3),
  limits: defaultLimits,
}

const member = (role: Role, name: string, domain: string): DemoMember => ({
  id: `${domain.split('.')[0]}-${role}`,
  name,
  email: `${role}@${domain}`,
  role,
})

export const demoCompanies: readonly DemoCompany[] = [
  {
    id: 'larkhook',
    name: 'Larkhook Low Voltage',
    rules,
    members: [
      member('owner', 'Odell Farrow', 'larkhook.example'),
      member('office', 'Opal Finch', 'larkhook.example'),
      member('designer', 'Dana Sorrel', 'larkhook.example'),
      member('lead', 'Lane Garrity', 'larkhook.example'),
      member('technician', 'Tamsin Reed', 'larkhook.example'),
    ],
  },
  // A second company, so that anybody can see that nothing crosses.
  {
    id: 'quoin-batten',
    name: 'Quoin & Batten Systems',
    rules: { ...rules, lengthUnit: 'm', conductorUnit: 'mm2', slackRackMm: 3000, slackPlateMm: 500 },
    members: [
      member('owner', 'Quill Barrow', 'quoinbatten.example'),
      member('designer', 'Quincy Dell', 'quoinbatten.example'),
    ],
  },
]

/** The demo sign-ins, as the start command prints them. */
export function demoSignIns(): string {
  const lines = demoCompanies.flatMap((company) => [
    company.name,
    ...company.members.map((each) => `  ${each.role.padEnd(11)} ${each.email}`),
  ])
  return [`Demo sign-ins, for looking round only, all with the passphrase "${demoPassphrase}":`, ...lines].join('\n')
}
