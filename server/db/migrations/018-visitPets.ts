import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'visitPets',
  `
  ${owned},
  visitId UUID NOT NULL,
  petId UUID NOT NULL,
  position INT NOT NULL,
  UNIQUE KEY onePet (businessId, visitId, petId),
  KEY byPet (businessId, petId),
  ${ofBusiness},
  ${owns('visitId', 'visits', 'CASCADE')},
  ${owns('petId', 'pets')}
`,
);
