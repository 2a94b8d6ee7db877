import { table } from '../table.ts';

export const { up, down } = table(
  'users',
  `
  id UUID NOT NULL PRIMARY KEY,
  email VARCHAR(254) NOT NULL UNIQUE,
  name VARCHAR(80) NOT NULL,
  passwordHash VARCHAR(100) NOT NULL,
  createdAt DATETIME(3) NOT NULL
`,
);
