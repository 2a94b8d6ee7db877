import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'arrivalLinks',
  `
  ${owned},
  visitId UUID NOT NULL,
  runId UUID NULL,
  tokenHash CHAR(64) NOT NULL UNIQUE,
  expiresAt DATETIME(3) NOT NULL,
  createdAt DATETIME(3) NOT NULL,
  ${ofBusiness},
  ${owns('visitId', 'visits', 'CASCADE')},
  ${owns('runId', 'runs')}
`,
);
