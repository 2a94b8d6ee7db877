import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'memberships',
  `
  ${owned},
  userId UUID NOT NULL,
  roles JSON NOT NULL,
  groomerId UUID NULL,
  createdAt DATETIME(3) NOT NULL,
  UNIQUE KEY onePerPerson (businessId, userId),
  KEY byUser (userId),
  ${ofBusiness},
  ${owns('groomerId', 'groomers')},
  FOREIGN KEY (userId) REFERENCES users (id) ON DELETE CASCADE
`,
);
