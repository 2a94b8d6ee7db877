import { useState } from 'react';
import { useSignOut } from '#src/api/session.ts';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { countUnsent } from '#src/offline/countUnsent.ts';
import { forgetRuns } from '#src/offline/forgetRuns.ts';

/**
 * Signs out, and asks first while this phone holds taps the server has not: they stay on the phone
 * for the same person's next sign-in, but nobody at the desk sees them until then.
 */
export function SignOutButton({ className }: { className: string }) {
  const signOut = useSignOut();
  const [unsent, setUnsent] = useState<number | null>(null);
  const leave = async () => {
    await forgetRuns();
    signOut.mutate();
  };
  const ask = async () => {
    const count = await countUnsent();
    if (count > 0) setUnsent(count);
    else await leave();
  };
  return (
    <>
      <button
        type="button"
        className={className}
        disabled={signOut.isPending}
        onClick={() => void ask()}
      >
        Sign out
      </button>
      {unsent !== null && (
        <ConfirmDialog
          title={`${unsent} ${unsent === 1 ? 'tap is' : 'taps are'} not sent yet`}
          confirm="Sign out all the same"
          keep="Stay signed in"
          busy={signOut.isPending}
          onConfirm={() => void leave()}
          onClose={() => setUnsent(null)}
        >
          The desk does not know them yet. They stay on this phone and go out when you sign in here
          again with a network.
        </ConfirmDialog>
      )}
    </>
  );
}
