import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'households',
  `
  ${owned},
  name VARCHAR(80) NOT NULL,
  addressLabel VARCHAR(160) NOT NULL,
  lat DOUBLE NOT NULL,
  lon DOUBLE NOT NULL,
  siteId UUID NULL,
  accessNotes TEXT NOT NULL,
  handoverNotes TEXT NOT NULL,
  gateCodeSealed VARCHAR(300) NULL,
  contactName VARCHAR(80) NOT NULL,
  phone VARCHAR(16) NULL,
  textsConsent TINYINT(1) NOT NULL DEFAULT 0,
  consentChangedAt DATETIME(3) NULL,
  secondContactName VARCHAR(80) NOT NULL DEFAULT '',
  secondContactPhone VARCHAR(16) NULL,
  createdAt DATETIME(3) NOT NULL,
  KEY byName (businessId, name),
  KEY byPhone (businessId, phone),
  ${ofBusiness},
  ${owns('siteId', 'sites')}
`,
);
