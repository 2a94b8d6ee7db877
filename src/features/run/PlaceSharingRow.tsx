import type { PlaceSharing } from './usePositionFixes.ts';

/** Says what the household sees of the van, and asks once, by touch. */
export function PlaceSharingRow({
  sharing,
  onAllow,
}: {
  sharing: PlaceSharing;
  onAllow: () => void;
}) {
  if (sharing === 'unknown') return null;
  if (sharing === 'mayAsk')
    return (
      <div className="mb-3 flex items-center justify-between gap-3 rounded-card bg-linen py-1 pr-2 pl-4">
        <span className="text-[15px] leading-snug">
          Let the household see the van while you drive to them?
        </span>
        <button
          type="button"
          onClick={onAllow}
          className="min-h-12 shrink-0 px-3 font-semibold text-collar underline underline-offset-3"
        >
          Share place
        </button>
      </div>
    );
  return (
    <p className="mb-3 text-[15px] text-slate">
      {sharing === 'on'
        ? 'The household sees the van while this page is in front; else where it is expected.'
        : 'The household sees where the van is expected: this phone does not share its place.'}
    </p>
  );
}
