import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'photos',
  `
  ${owned},
  petStyleId UUID NOT NULL,
  fileName VARCHAR(60) NOT NULL,
  bytes INT NOT NULL,
  width INT NOT NULL,
  height INT NOT NULL,
  sha256 CHAR(64) NOT NULL,
  takenAt DATETIME(3) NOT NULL,
  KEY byPetStyle (businessId, petStyleId),
  ${ofBusiness},
  ${owns('petStyleId', 'petStyles', 'CASCADE')}
`,
);
