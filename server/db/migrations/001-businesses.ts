import { table } from '../table.ts';

export const { up, down } = table(
  'businesses',
  `
  id UUID NOT NULL PRIMARY KEY,
  name VARCHAR(80) NOT NULL,
  timeZone VARCHAR(60) NOT NULL,
  currency CHAR(3) NOT NULL,
  distanceUnit VARCHAR(2) NOT NULL,
  weightUnit VARCHAR(2) NOT NULL,
  areaName VARCHAR(60) NOT NULL DEFAULT '',
  senderPhone VARCHAR(16) NULL UNIQUE,
  deskPhone VARCHAR(16) NULL,
  setUpMinutes INT NOT NULL DEFAULT 6,
  cleanDownMinutes INT NOT NULL DEFAULT 6,
  weights JSON NOT NULL,
  isDemo TINYINT(1) NOT NULL DEFAULT 0,
  createdAt DATETIME(3) NOT NULL
`,
);
