import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'groomers',
  `
  ${owned},
  name VARCHAR(80) NOT NULL,
  skills JSON NOT NULL,
  active TINYINT(1) NOT NULL DEFAULT 1,
  ${ofBusiness}
`,
);
