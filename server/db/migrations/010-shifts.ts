import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'shifts',
  `
  ${owned},
  date DATE NOT NULL,
  vanId UUID NOT NULL,
  groomerId UUID NOT NULL,
  startMinutes INT NOT NULL,
  endMinutes INT NOT NULL,
  mostOvertimeMinutes INT NOT NULL,
  meal JSON NULL,
  UNIQUE KEY oneVan (businessId, date, vanId),
  UNIQUE KEY oneGroomer (businessId, date, groomerId),
  ${ofBusiness},
  ${owns('vanId', 'vans')},
  ${owns('groomerId', 'groomers')}
`,
);
