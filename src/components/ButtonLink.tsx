import type { ComponentProps } from 'react';
import { Link } from 'react-router-dom';
import { buttonLook, type ButtonKind, type ButtonSize } from './buttonLook.ts';

/** A link to another screen that looks like a button. */
export function ButtonLink({
  kind,
  size,
  className = '',
  ...rest
}: ComponentProps<typeof Link> & { kind?: ButtonKind; size?: ButtonSize }) {
  return <Link {...rest} className={`${buttonLook(kind, size)} no-underline ${className}`} />;
}
