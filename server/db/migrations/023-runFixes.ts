import { ofBusiness, owned, owns, table } from '../table.ts';

export const { up, down } = table(
  'runFixes',
  `
  ${owned},
  runId UUID NOT NULL,
  lat DOUBLE NOT NULL,
  lon DOUBLE NOT NULL,
  at DATETIME(3) NOT NULL,
  accuracyMetres INT NOT NULL,
  KEY latest (businessId, runId, at),
  KEY byTime (at),
  ${ofBusiness},
  ${owns('runId', 'runs')}
`,
);
