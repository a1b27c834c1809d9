import type { ComponentProps } from 'react';
import { Link } from 'react-router';

/** `main` is the one main action of a page, 72 px tall; `small` is 44 px. */
export type ButtonKind = 'main' | 'plain' | 'small';

const classOf: Record<ButtonKind, string> = {
  main: 'button button-main',
  plain: 'button',
  small: 'button button-small',
};

/** A button; in a form it submits unless `type="button"` is said. */
export function Button({
  kind = 'plain',
  className = '',
  ...rest
}: ComponentProps<'button'> & { kind?: ButtonKind }) {
  return <button className={`${classOf[kind]} ${className}`} {...rest} />;
}

/** A way to another page that looks like a button. */
export function ButtonLink({
  kind = 'plain',
  className = '',
  ...rest
}: ComponentProps<typeof Link> & { kind?: ButtonKind }) {
  return <Link className={`${classOf[kind]} ${className}`} {...rest} />;
}
