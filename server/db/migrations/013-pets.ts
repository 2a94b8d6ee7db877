import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'pets',
  `
  ${owned},
  householdId UUID NOT NULL,
  name VARCHAR(80) NOT NULL,
  species VARCHAR(8) NOT NULL,
  breedId VARCHAR(60) NULL,
  weightGrams INT NULL,
  coatType VARCHAR(60) NULL,
  matting INT NOT NULL,
  soil INT NOT NULL,
  temperament VARCHAR(60) NOT NULL,
  birthYear INT NULL,
  cautions JSON NOT NULL,
  cautionNote TEXT NOT NULL,
  vetName VARCHAR(80) NOT NULL,
  vetPhone VARCHAR(16) NULL,
  styleId VARCHAR(60) NOT NULL,
  styleNotes TEXT NOT NULL,
  intervalWeeks INT NOT NULL,
  active TINYINT(1) NOT NULL DEFAULT 1,
  KEY byHousehold (businessId, householdId),
  ${ofBusiness},
  ${owns('householdId', 'households')}
`,
);
