import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'runs',
  `
  ${owned},
  date DATE NOT NULL,
  vanId UUID NOT NULL,
  groomerId UUID NOT NULL,
  version INT NOT NULL DEFAULT 1,
  stops JSON NOT NULL,
  sentVersion INT NULL,
  sentAt DATETIME(3) NULL,
  draftVersionSent INT NULL,
  UNIQUE KEY oneVan (businessId, date, vanId),
  ${ofBusiness},
  ${owns('vanId', 'vans')},
  ${owns('groomerId', 'groomers')}
`,
);
