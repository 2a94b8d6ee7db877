import { FakeLetters } from '#src/features/texts/FakeLetters.tsx';

export function FakeLettersScreen() {
  return <FakeLetters />;
}
