import { PageHeader } from '#src/components/PageHeader.tsx';

export function DayScreen() {
  return <PageHeader title="Day" />;
}
