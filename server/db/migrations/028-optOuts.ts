import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'optOuts',
  `
  ${owned},
  sender VARCHAR(16) NOT NULL,
  phone VARCHAR(16) NOT NULL,
  at DATETIME(3) NOT NULL,
  UNIQUE KEY once (businessId, sender, phone),
  ${ofBusiness}
`,
);
