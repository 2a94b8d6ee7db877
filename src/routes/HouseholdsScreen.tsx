import { PageHeader } from '#src/components/PageHeader.tsx';

export function HouseholdsScreen() {
  return <PageHeader title="Households" />;
}
