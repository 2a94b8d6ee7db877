import { app, useApp } from '../support/useApp.ts';
import { afterAll, expect, it } from 'vitest';
import { dropProposal, getProposal, startProposal } from '#shared/api/days.ts';
import { inBusiness } from '#server/db/database.ts';
import { Proposal as ProposalRow } from '#server/models/Proposal.ts';
import { closePlanner } from '#server/optimiser/planInWorker.ts';
import { boardDay } from '../support/boardDay.ts';

useApp();
afterAll(closePlanner);

it('holds its lease while it waits behind another business’s search', async () => {
  const [long, short] = [await boardDay(app), await boardDay(app)];
  const start = ({ client, date }: typeof long, seconds: number) =>
    client.must(startProposal, { params: { date }, body: { seconds } });
  const first = await start(long, 60);
  const second = await start(short, 1);
  const row = () =>
    inBusiness(short.client.session!.business.id, () => ProposalRow.findByPk(second.id));
  const lease = (await row())!.leaseUntil!.getTime();
  await expect
    .poll(async () => (await row())!.leaseUntil!.getTime(), { timeout: 9000, interval: 250 })
    .toBeGreaterThan(lease);
  expect((await row())!.state).toBe('working');
  await long.client.must(dropProposal, { params: { proposalId: first.id } });
  await expect
    .poll(
      async () =>
        (await short.client.must(getProposal, { params: { proposalId: second.id } })).state,
      { timeout: 5000 },
    )
    .toBe('ready');
});
