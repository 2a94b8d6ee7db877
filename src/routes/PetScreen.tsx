import { PageHeader } from '#src/components/PageHeader.tsx';

export function PetScreen() {
  return <PageHeader title="Pet" />;
}
