import { ReviewPage } from '#src/features/review/ReviewPage.tsx';

export function ReviewScreen() {
  return <ReviewPage />;
}
