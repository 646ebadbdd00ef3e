import { type ButtonHTMLAttributes, type ReactNode, useId } from 'react';
import { joinClasses } from './join-classes.ts';

export type ButtonVariant = 'primary' | 'plain' | 'quiet' | 'danger' | 'brass';

type ButtonProps = {
  readonly children?: ReactNode;
  readonly variant?: ButtonVariant | undefined;
  readonly type?: 'submit' | 'button' | undefined;
  readonly size?: 'medium' | 'small' | undefined;
  /** Makes it a link that looks like a button. */
  readonly href?: string | undefined;
  readonly disabled?: boolean | undefined;
  /** Why it cannot be pressed: shown beside it and read out with it. */
  readonly reason?: string | undefined;
  readonly wide?: boolean | undefined;
} & Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'type' | 'disabled' | 'children'>;

const LOOKS: Record<ButtonVariant, string> = {
  primary: 'border-dye bg-dye text-on-dye hover:bg-dye-deep',
  plain: 'border-dye bg-sheet text-dye hover:bg-dye-wash',
  quiet: 'border-transparent text-dye underline underline-offset-4 hover:bg-dye-wash',
  danger: 'border-primer bg-sheet text-primer hover:bg-primer hover:text-on-primer',
  brass: 'border-brass bg-brass text-on-brass hover:bg-brass-wash hover:text-ink',
};

const SIZES = {
  medium: 'min-h-10 px-4 py-1.5',
  small: 'min-h-8 px-3 py-0.5 text-sm',
};

/** A button, or a link that looks like one. Its words say what will happen. */
export function Button({
  children,
  variant = 'plain',
  type = 'button',
  size = 'medium',
  href,
  disabled = false,
  reason,
  wide = false,
  className,
  // Astro passes the place it is slotted into; it means nothing in the page.
  slot: _slot,
  ...rest
}: ButtonProps) {
  const reasonId = useId();
  const explained = disabled && reason !== undefined;
  const look = joinClasses(
    'inline-flex items-center justify-center gap-2 border text-center leading-tight font-bold no-underline',
    SIZES[size],
    disabled
      ? 'cursor-not-allowed border-dashed border-line-strong bg-transparent text-ink-soft'
      : LOOKS[variant],
    wide && 'w-full',
    className,
  );
  const described = explained ? { 'aria-describedby': reasonId } : {};
  const control =
    href === undefined ? (
      <button {...rest} {...described} type={type} disabled={disabled} className={look}>
        {children}
      </button>
    ) : (
      <a
        {...(disabled ? { role: 'link', 'aria-disabled': true } : { href })}
        {...described}
        id={rest.id}
        className={look}
      >
        {children}
      </a>
    );
  if (!explained) return control;
  return (
    <span className={joinClasses('inline-flex flex-col items-start gap-1', wide && 'w-full')}>
      {control}
      <span id={reasonId} className="text-sm text-ink-soft">
        {reason}
      </span>
    </span>
  );
}
