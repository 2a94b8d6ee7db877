import { PageHeader } from '#src/components/PageHeader.tsx';
import { QuickForecast } from '#src/features/households/QuickForecast.tsx';

/** What a pet told over the phone would take, cost, and when it could come. */
export function ForecastScreen() {
  return (
    <>
      <PageHeader title="Forecast" dim="for a pet told over the phone; nothing is kept" />
      <QuickForecast />
    </>
  );
}
