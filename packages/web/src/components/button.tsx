import type { ComponentProps } from 'react';

type Look = 'plain' | 'main' | 'seal' | 'bare';

export function Button({
  look = 'plain',
  isBusy = false,
  isBig = false,
  className = '',
  children,
  disabled,
  type = 'button',
  ...rest
}: ComponentProps<'button'> & { look?: Look; isBusy?: boolean; isBig?: boolean }) {
  const classes = ['btn', look === 'plain' ? '' : look, isBig ? 'big' : '', className].filter(Boolean).join(' ');
  return (
    <button
      type={type}
      className={classes}
      disabled={disabled === true || isBusy}
      aria-busy={isBusy || undefined}
      {...rest}
    >
      {children}
    </button>
  );
}
