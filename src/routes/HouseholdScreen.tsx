import { PageHeader } from '#src/components/PageHeader.tsx';

export function HouseholdScreen() {
  return <PageHeader title="Household" />;
}
