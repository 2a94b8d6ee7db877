import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'visits',
  `
  ${owned},
  householdId UUID NOT NULL,
  date DATE NOT NULL,
  status VARCHAR(12) NOT NULL DEFAULT 'booked',
  allowed JSON NOT NULL,
  preferredGroomerId UUID NULL,
  pin JSON NULL,
  note TEXT NOT NULL,
  forecast JSON NOT NULL,
  modelVersion VARCHAR(40) NOT NULL,
  cancelReason VARCHAR(200) NULL,
  createdAt DATETIME(3) NOT NULL,
  KEY byDate (businessId, date, status),
  KEY byHousehold (businessId, householdId, date),
  ${ofBusiness},
  ${owns('householdId', 'households')},
  ${owns('preferredGroomerId', 'groomers')}
`,
);
