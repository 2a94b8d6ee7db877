import { PageHeader } from '#src/components/PageHeader.tsx';

export function RunListScreen() {
  return <PageHeader title="RunList" />;
}
