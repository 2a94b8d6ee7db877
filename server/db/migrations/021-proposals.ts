import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'proposals',
  `
  ${owned},
  dayId UUID NOT NULL,
  scope VARCHAR(12) NOT NULL,
  state VARCHAR(10) NOT NULL,
  progressPermille INT NOT NULL DEFAULT 0,
  runVersions JSON NOT NULL,
  plan JSON NULL,
  message VARCHAR(300) NULL,
  seed INT NOT NULL,
  iterations INT NULL,
  leaseUntil DATETIME(3) NULL,
  createdAt DATETIME(3) NOT NULL,
  createdBy VARCHAR(80) NOT NULL,
  KEY byDay (businessId, dayId, state),
  ${ofBusiness},
  ${owns('dayId', 'days')}
`,
);
