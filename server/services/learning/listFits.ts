import { GroomFit } from '#server/models/GroomFit.ts';

/** The newest nights of learning, without their effects. */
export function listFits(limit = 30): Promise<GroomFit[]> {
  return GroomFit.findAll({
    order: [['fittedAt', 'DESC']],
    attributes: { exclude: ['pair'] },
    limit,
  });
}
