import type { ReactNode } from 'react';
import type { NavIcon } from './navItems.ts';

/** Pictures of the bottom navigation, drawn from our own strips, vans and doors. */
export const navIcons: Record<NavIcon, ReactNode> = {
  day: icon(
    <>
      <path d="M2 19h20" />
      <path d="M4 19v-4h4v4M8 19V11h4v8M12 19V5h5v14M17 19v-5h3v5" />
    </>,
  ),
  run: icon(
    <>
      <path d="M2 16V7a1 1 0 0 1 1-1h11v10M14 9h4l4 4v3h-2" />
      <path d="M9 16h6" />
      <circle cx="6.5" cy="16.5" r="2.2" />
      <circle cx="17.5" cy="16.5" r="2.2" />
    </>,
  ),
  households: icon(<path d="M3 11.5 12 4l9 7.5M5.5 10v10h13V10M10 20v-6h4v6" />),
  // A telephone's handset with minutes running beside it.
  forecast: icon(
    <>
      <path d="M5 4.5h3l1.500 4-2 1.500a12 12 0 0 0 5.500 5.500l1.500-2 4 1.500v3c0 .9-.7 1.500-1.500 1.500C10.500 19 4 12.500 3.500 6c0-.8.6-1.500 1.500-1.500z" />
      <path d="M13.500 4.500h7M13.500 8h4.500" />
    </>,
  ),
  texts: icon(<path d="M4 5h16v11H10l-4.5 4V16H4zM8 9h8M8 12h5" />),
  review: icon(<path d="M4 20V4M4 20h16M8 16l4-5 3 2.5L20 7" />),
  setup: icon(<path d="M4 7h9M17 7h3M4 17h3M11 17h9M15 4.8v4.4M9 14.8v4.4" />),
};

function icon(children: ReactNode) {
  return (
    <svg
      viewBox="0 0 24 24"
      className="size-6"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.8"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
    >
      {children}
    </svg>
  );
}
