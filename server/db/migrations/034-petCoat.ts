import { addColumns } from '../table.ts';

export const { up, down } = addColumns('pets', {
  undercoatLoad: 'INT NOT NULL DEFAULT 0',
  mattingByRegion: 'JSON NULL',
  tableLimitMinutes: 'INT NULL',
});
