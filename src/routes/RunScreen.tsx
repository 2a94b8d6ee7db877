import { useParams } from 'react-router-dom';
import { useSession } from '#src/api/sessionStore.ts';
import { RunPage } from '#src/features/run/RunPage.tsx';
import { navItems } from './navItems.ts';

export function RunScreen() {
  const { runId } = useParams();
  const session = useSession();
  const tabs = navItems(session.abilities, session.groomerId !== null).length;
  return <RunPage runId={runId!} aboveNav={tabs > 1} />;
}
