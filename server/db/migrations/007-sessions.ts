import { ofBusiness, table } from '../table.ts';

export const { up, down } = table(
  'sessions',
  `
  id UUID NOT NULL PRIMARY KEY,
  userId UUID NOT NULL,
  businessId UUID NOT NULL,
  refreshHash CHAR(64) NOT NULL UNIQUE,
  previousHash CHAR(64) NULL,
  generation INT NOT NULL DEFAULT 1,
  successorUsedAt DATETIME(3) NULL,
  rotatedAt DATETIME(3) NOT NULL,
  expiresAt DATETIME(3) NOT NULL,
  revokedAt DATETIME(3) NULL,
  createdAt DATETIME(3) NOT NULL,
  KEY byUser (userId),
  FOREIGN KEY (userId) REFERENCES users (id) ON DELETE CASCADE,
  ${ofBusiness}
`,
);
