import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'places',
  `
  ${owned},
  kind VARCHAR(20) NOT NULL,
  name VARCHAR(80) NOT NULL,
  addressLabel VARCHAR(160) NOT NULL,
  lat DOUBLE NOT NULL,
  lon DOUBLE NOT NULL,
  phone VARCHAR(16) NULL,
  opensMinutes INT NOT NULL,
  closesMinutes INT NOT NULL,
  lengthMinutes INT NOT NULL,
  ${ofBusiness}
`,
);
