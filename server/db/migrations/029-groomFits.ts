import { ofBusiness, owned, table } from '../table.ts';

export const { up, down } = table(
  'groomFits',
  `
  ${owned},
  fittedAt DATETIME(3) NOT NULL,
  modelVersion VARCHAR(40) NOT NULL,
  records INT NOT NULL,
  leftOut INT NOT NULL,
  heldOut INT NOT NULL,
  beforeSeconds INT NOT NULL,
  afterSeconds INT NOT NULL,
  kept BOOLEAN NOT NULL,
  pair JSON NULL,
  KEY newest (businessId, kept, fittedAt),
  ${ofBusiness}
`,
);
