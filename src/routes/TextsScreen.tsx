import { TextList } from '#src/features/texts/TextList.tsx';

export function TextsScreen() {
  return <TextList />;
}
