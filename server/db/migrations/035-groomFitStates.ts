import { addColumns } from '../table.ts';

export const { up, down } = addColumns('groomFits', {
  state: "VARCHAR(10) NOT NULL DEFAULT 'done'",
  leaseUntil: 'DATETIME(3) NULL',
});
