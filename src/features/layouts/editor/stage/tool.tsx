import type { ReactNode } from 'react';

interface Props {
  name: string;
  disabled?: boolean;
  /** For a tool that stays in the hand until it is put down. */
  pressed?: boolean;
  onPress: () => void;
  children: ReactNode;
}

/** A button of the strip over the wall: a picture, with its name for readers and on hovering. */
export function Tool({ name, disabled = false, pressed, onPress, children }: Props) {
  return (
    <button
      type="button"
      aria-label={name}
      title={name}
      aria-pressed={pressed}
      aria-disabled={disabled || undefined}
      onClick={disabled ? undefined : onPress}
      className="inline-flex size-9 items-center justify-center rounded-sm border border-ink-500 bg-white text-ink-900 hover:border-chalk-600 hover:text-chalk-700 aria-disabled:cursor-not-allowed aria-disabled:opacity-50 aria-pressed:border-chalk-600 aria-pressed:bg-chalk-100"
    >
      {children}
    </button>
  );
}
