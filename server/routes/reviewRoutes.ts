import { Router } from 'express';
import * as api from '#shared/api/review.ts';
import { handle } from '#server/http/handle.ts';
import { getReview } from '#server/services/review/getReview.ts';
import { reviewCsv } from '#server/services/review/reviewCsv.ts';

export const reviewRoutes = Router();

handle(reviewRoutes, api.getReview, 'review.read', ({ actor, query, now }) =>
  getReview(actor.businessId, query.date, now),
);
handle(reviewRoutes, api.exportReview, 'review.read', async ({ actor, query, now, res }) => {
  const review = await getReview(actor.businessId, query.date, now);
  res.type('text/csv; charset=utf-8').attachment(`furlong-${review.from}.csv`);
  return reviewCsv(review);
});
