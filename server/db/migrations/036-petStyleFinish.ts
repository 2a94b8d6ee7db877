import { addColumns } from '../table.ts';

export const { up, down } = addColumns('petStyles', { ownFinish: 'VARCHAR(10) NULL' });
