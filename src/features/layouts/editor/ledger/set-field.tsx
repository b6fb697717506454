import { useState } from 'react';
import { AngleField } from '../../../../components/angle-field.tsx';
import { classNames } from '../../../../components/class-names.ts';
import { LengthField } from '../../../../components/length-field.tsx';
import { MassField } from '../../../../components/mass-field.tsx';
import type { QuantityFieldProps } from '../../../../components/quantity-field.tsx';

interface Props {
  label: string;
  value: number | null;
  /** Called when the field is left or Enter is pressed with something new and readable in it. */
  onSet: (value: number | null) => void;
  hint?: string;
  error?: string;
  optional?: boolean;
  disabled?: boolean;
  className?: string;
  /** Label before the box instead of over it. */
  inline?: boolean;
}

/** A figure that takes effect when it is finished, not at every stroke. */
function SetField({ Control, value, onSet, optional = false, inline = false, className, ...rest }: Props & { Control: (props: QuantityFieldProps) => React.ReactNode }) {
  const [typed, setTyped] = useState<{ value: number | null; over: number | null } | null>(null);
  // What is typed is given up when the bench changes under it, by undo or by hand.
  const own = typed && typed.over === value ? typed : null;
  const finish = () => {
    setTyped(null);
    if (!own || Number.isNaN(own.value) || own.value === value) return;
    if (own.value === null && !optional) return;
    onSet(own.value);
  };
  return (
    <div
      className={classNames(inline && '[&>div]:flex [&>div]:flex-wrap [&>div]:items-center [&>div]:gap-2 [&_label]:mb-0 [&_input]:w-24 [&_input]:min-h-9 [&_input]:py-1', className)}
      onKeyDown={(event) => (event.key === 'Enter' ? finish() : undefined)}
    >
      <Control {...rest} optional={optional} value={own ? own.value : value} onChange={(next) => setTyped({ value: next, over: value })} onBlur={() => (own && Number.isNaN(own.value) ? undefined : finish())} />
    </div>
  );
}

export const SetLengthField = (props: Props) => <SetField Control={LengthField} {...props} />;
export const SetAngleField = (props: Props) => <SetField Control={AngleField} {...props} />;
export const SetMassField = (props: Props) => <SetField Control={MassField} {...props} />;
