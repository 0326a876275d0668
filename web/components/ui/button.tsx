import type { ReactNode } from 'react';
import { Button as AriaButton, type ButtonProps as AriaButtonProps } from 'react-aria-components';
import { Link, type LinkProps } from 'react-router-dom';
import { Kbd } from './kbd';

export type ButtonKind = 'primary' | 'outlined' | 'text' | 'inline';

interface Look {
  /** One primary (ink) button per page; outlined for the second act, underlined text for the rest. */
  kind?: ButtonKind;
  /** The key that does the same, shown inside: `D`, `Ctrl Enter`. */
  keyHint?: string;
  children: ReactNode;
}

export function Button({
  kind = 'outlined',
  keyHint,
  children,
  className,
  ...props
}: Look & Omit<AriaButtonProps, 'children' | 'className'> & { className?: string }) {
  return (
    <AriaButton {...props} className={classOf(kind, className)}>
      {children}
      {keyHint ? <Kbd hidden>{keyHint}</Kbd> : null}
    </AriaButton>
  );
}

/** An address that looks like a button; `href` for a file to save, `to` for a page of the product. */
export function LinkButton({
  kind = 'outlined',
  keyHint,
  children,
  className,
  ...props
}: Look & Omit<LinkProps, 'children'>) {
  return (
    <Link {...props} className={classOf(kind, className)}>
      {children}
      {keyHint ? <Kbd hidden>{keyHint}</Kbd> : null}
    </Link>
  );
}

export function classOf(kind: ButtonKind, extra?: string): string {
  const look = {
    primary: 'button button-primary',
    outlined: 'button',
    text: 'button button-text',
    inline: 'button button-text button-inline',
  }[kind];
  return extra ? `${look} ${extra}` : look;
}
