import { FakePhones } from '#src/features/texts/FakePhones.tsx';

export function FakePhonesScreen() {
  return <FakePhones />;
}
