import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'dayChanges',
  `
  ${owned},
  dayId UUID NOT NULL,
  seq INT NOT NULL,
  at DATETIME(3) NOT NULL,
  userId UUID NULL,
  who VARCHAR(80) NOT NULL,
  kind VARCHAR(30) NOT NULL,
  words VARCHAR(300) NOT NULL,
  move JSON NULL,
  \`before\` JSON NULL,
  \`after\` JSON NULL,
  undoneAt DATETIME(3) NULL,
  undoes UUID NULL,
  UNIQUE KEY oneSeq (businessId, dayId, seq),
  KEY byTime (at),
  ${ofBusiness},
  ${owns('dayId', 'days')}
`,
);
