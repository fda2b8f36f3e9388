'use client';

import type { ComponentProps } from 'react';

type Weight = 'solid' | 'outline' | 'plain';
const CLASS: Record<Weight, string> = {
  solid: 'button button-solid',
  outline: 'button',
  plain: 'button border-transparent font-normal underline',
};

/** Keeps its words while it works; a second press meanwhile does nothing. */
export function Button({
  weight = 'outline',
  pending = false,
  className = '',
  children,
  onClick,
  type = 'button',
  ...rest
}: { weight?: Weight; pending?: boolean } & ComponentProps<'button'>) {
  return (
    <button
      type={type}
      className={`${CLASS[weight]} ${className}`}
      aria-busy={pending}
      onClick={(event) => {
        if (pending) event.preventDefault();
        else onClick?.(event);
      }}
      {...rest}
    >
      {pending ? 'Working…' : children}
    </button>
  );
}
