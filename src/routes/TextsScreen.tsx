import { PageHeader } from '#src/components/PageHeader.tsx';

export function TextsScreen() {
  return <PageHeader title="Texts" />;
}
