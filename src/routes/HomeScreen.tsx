import { Navigate } from 'react-router-dom';
import { useSession } from '#src/api/sessionStore.ts';

/** The one home that fits: the desk sees the day, a groomer sees the run. */
export function HomeScreen() {
  const { abilities } = useSession();
  return <Navigate to={abilities.includes('days.read') ? '/day' : '/run'} replace />;
}
