import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';

/** A screen of this business that the person's roles do not open. */
export function NotAllowedScreen() {
  return (
    <>
      <PageHeader title="Not part of your roles" />
      <p className="mb-4 max-w-prose text-slate">
        Your roles in this business do not open this screen. Ask an operator if you need it.
      </p>
      <ButtonLink to="/" kind="go">
        Go to your start
      </ButtonLink>
    </>
  );
}
