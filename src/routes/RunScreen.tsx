import { PageHeader } from '#src/components/PageHeader.tsx';

export function RunScreen() {
  return <PageHeader title="Run" />;
}
