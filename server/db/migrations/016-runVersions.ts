import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'runVersions',
  `
  ${owned},
  runId UUID NOT NULL,
  version INT NOT NULL,
  sentAt DATETIME(3) NOT NULL,
  sentBy VARCHAR(80) NOT NULL,
  problem JSON NOT NULL,
  plan JSON NOT NULL,
  times JSON NOT NULL,
  cards JSON NOT NULL,
  areaVersion VARCHAR(64) NULL,
  modelVersion VARCHAR(40) NOT NULL,
  evaluatorVersion VARCHAR(40) NOT NULL,
  UNIQUE KEY oneVersion (businessId, runId, version),
  ${ofBusiness},
  ${owns('runId', 'runs')}
`,
);
