import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'gateOpenings',
  `
  ${owned},
  householdId UUID NOT NULL,
  userId UUID NOT NULL,
  at DATETIME(3) NOT NULL,
  KEY byUser (businessId, userId, at),
  ${ofBusiness},
  ${owns('householdId', 'households')}
`,
);
