import { addColumns } from '../table.ts';

export const { up, down } = addColumns('businesses', {
  priceCentsPerHour: 'INT NOT NULL DEFAULT 0',
  calloutCents: 'INT NOT NULL DEFAULT 0',
});
