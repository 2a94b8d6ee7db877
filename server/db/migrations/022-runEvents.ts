import { ofBusiness, owns, table } from '../table.ts';

export const { up, down } = table(
  'runEvents',
  `
  businessId UUID NOT NULL,
  id UUID NOT NULL,
  runId UUID NOT NULL,
  userId UUID NULL,
  deviceId UUID NOT NULL,
  deviceSeq INT NOT NULL,
  deviceAt DATETIME(3) NOT NULL,
  offsetMs BIGINT NOT NULL,
  happenedAt DATETIME(3) NOT NULL,
  receivedAt DATETIME(3) NOT NULL,
  runVersion INT NOT NULL,
  stopId VARCHAR(64) NOT NULL,
  kind VARCHAR(20) NOT NULL,
  v INT NOT NULL,
  data JSON NOT NULL,
  PRIMARY KEY (businessId, id),
  KEY byRun (businessId, runId, happenedAt),
  ${ofBusiness},
  ${owns('runId', 'runs')}
`,
);
