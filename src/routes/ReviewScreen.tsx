import { PageHeader } from '#src/components/PageHeader.tsx';

export function ReviewScreen() {
  return <PageHeader title="Review" />;
}
