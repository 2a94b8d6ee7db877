import type { z } from 'zod';
import type { quickForecast } from '#shared/api/forecasts.ts';
import type { VisitForecast } from '#server/models/Visit.ts';

type Shown = z.input<(typeof quickForecast)['response']>;

export function presentQuickForecast(
  facts: Pick<
    Shown,
    | 'p50Seconds'
    | 'priceCents'
    | 'currency'
    | 'cautions'
    | 'planChangeWords'
    | 'offers'
    | 'noOfferWords'
  > & { forecast: VisitForecast },
): Shown {
  const { forecast, ...rest } = facts;
  return {
    ...rest,
    steps: forecast.steps.map(
      ({ key, family, label, medianSeconds, attentionPermille, reasons }) => ({
        key,
        family,
        label,
        medianSeconds,
        attentionPermille,
        reasons,
      }),
    ),
    p10Seconds: forecast.p10Seconds,
    p90Seconds: forecast.p90Seconds,
    setUpSeconds: forecast.setUpSeconds,
    cleanDownSeconds: forecast.cleanDownSeconds,
  };
}
