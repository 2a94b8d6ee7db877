import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'invitations',
  `
  ${owned},
  email VARCHAR(254) NOT NULL,
  roles JSON NOT NULL,
  groomerId UUID NULL,
  tokenHash CHAR(64) NOT NULL UNIQUE,
  expiresAt DATETIME(3) NOT NULL,
  closedAt DATETIME(3) NULL,
  ${ofBusiness},
  ${owns('groomerId', 'groomers')}
`,
);
