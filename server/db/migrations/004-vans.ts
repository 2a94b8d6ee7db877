import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'vans',
  `
  ${owned},
  name VARCHAR(80) NOT NULL,
  shape VARCHAR(20) NOT NULL,
  startPlaceId UUID NOT NULL,
  endPlaceId UUID NOT NULL,
  tanks JSON NOT NULL,
  tableLimitGrams INT NOT NULL,
  active TINYINT(1) NOT NULL DEFAULT 1,
  ${ofBusiness},
  ${owns('startPlaceId', 'places')},
  ${owns('endPlaceId', 'places')}
`,
);
