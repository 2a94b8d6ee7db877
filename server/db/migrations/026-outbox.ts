import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'outbox',
  `
  ${owned},
  visitId UUID NULL,
  householdId UUID NULL,
  kind VARCHAR(30) NOT NULL,
  promiseVersion INT NOT NULL DEFAULT 0,
  recipient VARCHAR(16) NOT NULL,
  sender VARCHAR(16) NOT NULL,
  body TEXT NOT NULL,
  status VARCHAR(12) NOT NULL DEFAULT 'waiting',
  reason VARCHAR(200) NULL,
  attempts INT NOT NULL DEFAULT 0,
  dueAt DATETIME(3) NOT NULL,
  staleAfter DATETIME(3) NOT NULL,
  leaseUntil DATETIME(3) NULL,
  attemptedAt DATETIME(3) NULL,
  sid VARCHAR(40) NULL,
  createdAt DATETIME(3) NOT NULL,
  statusAt DATETIME(3) NOT NULL,
  UNIQUE KEY once (businessId, visitId, kind, promiseVersion, recipient),
  KEY due (status, dueAt),
  KEY bySid (sid),
  KEY byHousehold (businessId, householdId, createdAt),
  ${ofBusiness},
  ${owns('visitId', 'visits')},
  ${owns('householdId', 'households')}
`,
);
