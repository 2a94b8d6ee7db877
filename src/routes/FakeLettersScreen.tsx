import { PageHeader } from '#src/components/PageHeader.tsx';

export function FakeLettersScreen() {
  return <PageHeader title="FakeLetters" />;
}
