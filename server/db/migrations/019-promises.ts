import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'promises',
  `
  ${owned},
  visitId UUID NOT NULL,
  version INT NOT NULL,
  date DATE NOT NULL,
  startMinutes INT NULL,
  endMinutes INT NULL,
  madeAt DATETIME(3) NOT NULL,
  madeBy VARCHAR(80) NOT NULL,
  UNIQUE KEY oneVersion (businessId, visitId, version),
  ${ofBusiness},
  ${owns('visitId', 'visits', 'CASCADE')}
`,
);
