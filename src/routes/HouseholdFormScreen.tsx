import { PageHeader } from '#src/components/PageHeader.tsx';

export function HouseholdFormScreen() {
  return <PageHeader title="HouseholdForm" />;
}
