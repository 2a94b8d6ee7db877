import type { NamedAbility } from '#shared/api/abilities.ts';

export type NavIcon = 'day' | 'run' | 'households' | 'forecast' | 'texts' | 'review' | 'setup';

export interface NavItem {
  to: string;
  words: string;
  icon: NavIcon;
}

const all: (NavItem & { ability: NamedAbility })[] = [
  { to: '/day', words: 'Day', icon: 'day', ability: 'days.read' },
  { to: '/run', words: 'Run', icon: 'run', ability: 'runs.work' },
  { to: '/households', words: 'Households', icon: 'households', ability: 'households.read' },
  { to: '/forecast', words: 'Forecast', icon: 'forecast', ability: 'households.edit' },
  { to: '/texts', words: 'Texts', icon: 'texts', ability: 'texts.read' },
  { to: '/review', words: 'Review', icon: 'review', ability: 'review.read' },
  { to: '/setup', words: 'Setup', icon: 'setup', ability: 'setup.read' },
];

/**
 * The screens a person may open. The desk may look at any run from the day, so 'Run' stands in the
 * navigation only of people who work in a van.
 */
export function navItems(abilities: readonly string[], worksInVan: boolean): NavItem[] {
  return all
    .filter((item) => abilities.includes(item.ability))
    .filter((item) => item.to !== '/run' || worksInVan || !abilities.includes('days.read'))
    .map(({ to, words, icon }) => ({ to, words, icon }));
}

/** Whether these abilities open an address; addresses outside the navigation are open to all. */
export function mayOpen(pathname: string, abilities: readonly string[]): boolean {
  const item = all.find(({ to }) => pathname === to || pathname.startsWith(`${to}/`));
  return !item || abilities.includes(item.ability);
}
