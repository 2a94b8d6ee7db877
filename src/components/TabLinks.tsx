import { useEffect, useRef } from 'react';
import { NavLink, useLocation } from 'react-router-dom';

/** Tabs that are addresses: each can be linked to and the back button works. */
export function TabLinks({
  label,
  tabs,
}: {
  label: string;
  tabs: readonly { to: string; words: string }[];
}) {
  const box = useRef<HTMLElement>(null);
  const { pathname } = useLocation();
  useEffect(() => {
    // On a phone the current tab may lie outside the row.
    const current = box.current?.querySelector<HTMLElement>('[aria-current]');
    if (box.current && current)
      box.current.scrollLeft =
        current.offsetLeft - box.current.clientWidth / 2 + current.clientWidth / 2;
  }, [pathname]);
  return (
    <nav ref={box} aria-label={label} className="-mx-4 overflow-x-auto px-4 md:mx-0 md:px-0">
      <ul className="flex min-w-max gap-1 border-b border-fawn">
        {tabs.map((tab) => (
          <li key={tab.to}>
            <NavLink
              to={tab.to}
              className={({ isActive }) =>
                `-mb-px grid min-h-11 place-items-center border-b-[3px] px-3.5 font-medium no-underline ${
                  isActive
                    ? 'border-collar text-ink'
                    : 'border-transparent text-slate hover:text-ink'
                }`
              }
            >
              {tab.words}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
