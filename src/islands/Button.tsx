import type { ButtonHTMLAttributes } from 'react';

/** `main` is the one thing a form is for; `plain` everything else; `text` sits in running text. */
export type ButtonKind = 'main' | 'plain' | 'text';

const looks: Record<ButtonKind, string> = {
  main: 'border border-accent bg-accent text-sheet px-4 min-h-9 hover:brightness-110',
  plain: 'border border-rule bg-sheet text-ink px-4 min-h-9 hover:border-quiet',
  text: 'text-accent underline underline-offset-2 min-h-6 hover:decoration-2',
};

/** A button's classes, for links that look like one. */
export function buttonLook(kind: ButtonKind): string {
  return (
    'inline-flex items-center justify-center gap-2 rounded-[3px] font-semibold cursor-pointer ' +
    'no-underline disabled:cursor-default disabled:opacity-50 focus-visible:outline-2 ' +
    `focus-visible:outline-offset-2 focus-visible:outline-accent ${looks[kind]}`
  );
}

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  kind?: ButtonKind;
}

export function Button({ kind = 'plain', className = '', type = 'button', ...rest }: ButtonProps) {
  return <button type={type} className={`${buttonLook(kind)} ${className}`} {...rest} />;
}
