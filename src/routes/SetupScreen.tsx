import { PageHeader } from '#src/components/PageHeader.tsx';

export function SetupScreen() {
  return <PageHeader title="Setup" />;
}
