import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'petStyles',
  `
  ${owned},
  petId UUID NOT NULL,
  version INT NOT NULL,
  styleId VARCHAR(60) NOT NULL,
  ownCuts JSON NULL,
  ownServices JSON NULL,
  ownPlanB JSON NULL,
  notes TEXT NOT NULL,
  madeAt DATETIME(3) NULL,
  madeBy VARCHAR(80) NOT NULL,
  UNIQUE KEY oneVersion (businessId, petId, version),
  ${ofBusiness},
  ${owns('petId', 'pets', 'CASCADE')}
`,
);
