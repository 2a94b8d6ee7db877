import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { findCircles, findForbidden, judgeImport } from './house.ts';

const root = fileURLToPath(new URL('..', import.meta.url));
const planted = fileURLToPath(new URL('./fixtures/house', import.meta.url));

describe('the house', () => {
  it('has no forbidden import', () => {
    expect(findForbidden(root)).toEqual([]);
  });

  it('has no import circle on any floor', () => {
    expect(findCircles(root, ['shared', 'server', 'src', 'tiles'])).toEqual([]);
  });

  it('complains about planted bad imports: a server, Node, a dynamic import, a new URL', () => {
    expect(findForbidden(planted)).toEqual([
      expect.stringContaining('shared/schedule/badImport.ts:1 imports node:fs: shared is pure'),
      expect.stringContaining('shared/schedule/badImport.ts:2 imports #server/app.ts'),
      expect.stringContaining(
        'shared/schedule/badImport.ts:4 imports #shared/optimiser/optimise.ts',
      ),
      expect.stringContaining(
        'src/features/day/badWorker.ts:1 imports ../run/RunScreen.tsx: no feature',
      ),
    ]);
  });

  it('keeps the domain off the contract and the client off the search', () => {
    expect(judgeImport('shared/schedule/x.ts', 'shared/api/days.ts')).not.toBeNull();
    expect(judgeImport('server/services/x.ts', 'shared/api/days.ts')).not.toBeNull();
    expect(judgeImport('server/routes/x.ts', 'server/models/Van.ts')).not.toBeNull();
    expect(judgeImport('src/features/day/x.ts', 'shared/optimiser/optimise.ts')).not.toBeNull();
    expect(judgeImport('src/components/x.ts', 'shared/schedule/types.ts')).not.toBeNull();
    expect(judgeImport('shared/api/x.ts', 'tests/house.ts')).toBe('nobody imports tests');
    expect(judgeImport('server/services/x.ts', 'shared/schedule/types.ts')).toBeNull();
  });
});
