import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';

/** An address nothing is at. */
export function NotFoundScreen() {
  return (
    <>
      <PageHeader title="Nothing is here" />
      <p className="mb-4 max-w-prose text-slate">
        This address leads nowhere. It may be mistyped, or what it showed was removed.
      </p>
      <ButtonLink to="/" kind="go">
        Go to the start
      </ButtonLink>
    </>
  );
}
