import { table } from '../table.ts';

export const { up, down } = table(
  'passwordResets',
  `
  id UUID NOT NULL PRIMARY KEY,
  userId UUID NOT NULL,
  tokenHash CHAR(64) NOT NULL UNIQUE,
  expiresAt DATETIME(3) NOT NULL,
  usedAt DATETIME(3) NULL,
  FOREIGN KEY (userId) REFERENCES users (id) ON DELETE CASCADE
`,
);
