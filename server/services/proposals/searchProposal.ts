import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import { inBusiness } from '#server/db/database.ts';
import { log } from '#server/log.ts';
import { Proposal } from '#server/models/Proposal.ts';
import { planInWorker } from '#server/optimiser/planInWorker.ts';

type SearchNews = Partial<
  Pick<Proposal, 'progressPermille' | 'plan' | 'state' | 'message' | 'iterations' | 'leaseUntil'>
>;

/** Past it, unless renewed, the process that searched is gone. */
export const leaseMs = 15_000;
const renewMs = 5000;

const searches = new Map<string, AbortController>();

/** Stops a search of this process; another process notices by the row's state. */
export function stopSearch(proposalId: string): void {
  searches.get(proposalId)?.abort();
}

/**
 * Runs the search outside any transaction and writes progress and result to the proposal's row. The
 * row's lease is renewed all the while, also while the search waits for others on the one thread.
 */
export async function searchProposal(
  businessId: string,
  proposalId: string,
  problem: DayProblem,
  plan: Plan,
  seconds: number,
  startedAt: Date,
): Promise<void> {
  const controller = new AbortController();
  const startedMs = performance.now();
  searches.set(proposalId, controller);
  // One write at a time, so that progress cannot overtake the result.
  let writes: Promise<unknown> = Promise.resolve();
  const write = (change: SearchNews) => {
    writes = writes
      .then(() => save(businessId, proposalId, change, controller))
      .catch((error: unknown) => {
        log.error({ err: error, proposalId }, 'a proposal could not be written');
      });
    return writes;
  };
  const renewal = setInterval(() => {
    const sinceMs = performance.now() - startedMs;
    void write({ leaseUntil: new Date(startedAt.getTime() + sinceMs + leaseMs) });
  }, renewMs);
  renewal.unref();
  try {
    const seed = await inBusiness(
      businessId,
      async () => (await Proposal.findByPk(proposalId))?.seed ?? 1,
    );
    const result = await planInWorker(problem, plan, {
      seed,
      seconds,
      signal: controller.signal,
      onProgress: ({ fractionDone }) =>
        void write({ progressPermille: Math.round(fractionDone * 1000) }),
      onBest: (best) => void write({ plan: best }),
    });
    await write({
      state: 'ready',
      plan: result.plan,
      progressPermille: 1000,
      iterations: result.iterations,
    });
  } catch (error) {
    if (!controller.signal.aborted) {
      log.error({ err: error, proposalId }, 'a search failed');
      await write({
        state: 'failed',
        message: 'The search broke off. Nothing changed; ask again.',
      });
    }
  } finally {
    clearInterval(renewal);
    searches.delete(proposalId);
  }
}

async function save(
  businessId: string,
  proposalId: string,
  change: SearchNews,
  controller: AbortController,
): Promise<void> {
  const [count] = await inBusiness(businessId, () =>
    Proposal.update(change, { where: { id: proposalId, state: 'working' } }),
  );
  if (count > 0) return;
  // No row changed: either nothing differed (then it is still working) or someone dropped it.
  const row = await inBusiness(businessId, () =>
    Proposal.findByPk(proposalId, { attributes: ['id', 'businessId', 'state'] }),
  );
  if (row?.state !== 'working' && row?.state !== 'ready') controller.abort();
}
