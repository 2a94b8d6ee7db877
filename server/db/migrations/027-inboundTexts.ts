import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'inboundTexts',
  `
  ${owned},
  householdId UUID NULL,
  sender VARCHAR(16) NOT NULL,
  recipient VARCHAR(16) NOT NULL,
  body TEXT NOT NULL,
  sid VARCHAR(40) NOT NULL,
  receivedAt DATETIME(3) NOT NULL,
  UNIQUE KEY oneSid (businessId, sid),
  KEY byHousehold (businessId, householdId, receivedAt),
  ${ofBusiness},
  ${owns('householdId', 'households')}
`,
);
