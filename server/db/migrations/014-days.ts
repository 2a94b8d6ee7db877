import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'days',
  `
  ${owned},
  date DATE NOT NULL,
  version INT NOT NULL DEFAULT 1,
  UNIQUE KEY oneDate (businessId, date),
  ${ofBusiness}
`,
);
