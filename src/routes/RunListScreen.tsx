import { RunList } from '#src/features/run/RunList.tsx';

export function RunListScreen() {
  return <RunList />;
}
