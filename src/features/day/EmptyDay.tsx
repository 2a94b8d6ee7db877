import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';

/** A day on which no van goes out. */
export function EmptyDay({
  past,
  notPlaced,
  canSetUp,
}: {
  past: boolean;
  notPlaced: number;
  canSetUp: boolean;
}) {
  return (
    <EmptyState
      title={past ? 'No van went out that day' : 'No van goes out this day yet'}
      action={
        !past && canSetUp ? (
          <ButtonLink kind="go" to="/setup/shifts">
            Set up shifts
          </ButtonLink>
        ) : undefined
      }
    >
      {!past &&
        (notPlaced > 0
          ? `${notPlaced === 1 ? 'One visit waits' : `${notPlaced} visits wait`}: give a groomer hours in a van and they can be placed.`
          : 'Give a groomer hours in a van, then book visits or move them here.')}
    </EmptyState>
  );
}
