import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'sites',
  `
  ${owned},
  name VARCHAR(80) NOT NULL,
  lat DOUBLE NOT NULL,
  lon DOUBLE NOT NULL,
  parkingNotes TEXT NOT NULL,
  gateCodeSealed VARCHAR(300) NULL,
  ${ofBusiness}
`,
);
