import { GroomFit } from '#server/models/GroomFit.ts';

/** The newest fits and the one in force, without their effects. */
export async function listFits(
  limit = 30,
): Promise<{ fits: GroomFit[]; inForce: GroomFit | null }> {
  const plain = {
    order: [['fittedAt', 'DESC']] as [string, string][],
    attributes: { exclude: ['pair'] },
  };
  const [fits, inForce] = await Promise.all([
    GroomFit.findAll({ ...plain, limit }),
    GroomFit.findOne({ ...plain, where: { kept: true } }),
  ]);
  return { fits, inForce };
}
