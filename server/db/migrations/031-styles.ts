import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'styles',
  `
  ${owned},
  name VARCHAR(80) NOT NULL,
  species VARCHAR(8) NOT NULL,
  coats JSON NOT NULL,
  cuts JSON NOT NULL,
  finish VARCHAR(8) NOT NULL,
  services JSON NOT NULL,
  planB JSON NOT NULL,
  basedOn VARCHAR(60) NULL,
  retired TINYINT(1) NOT NULL DEFAULT 0,
  createdAt DATETIME(3) NOT NULL,
  KEY byName (businessId, name),
  ${ofBusiness}
`,
);
