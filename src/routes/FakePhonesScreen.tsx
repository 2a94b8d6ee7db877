import { PageHeader } from '#src/components/PageHeader.tsx';

export function FakePhonesScreen() {
  return <PageHeader title="FakePhones" />;
}
