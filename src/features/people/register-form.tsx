import { peopleApi } from '../../../shared/people/people.api.ts';
import { Button } from '../../components/button.tsx';
import { ErrorState } from '../../components/error-state.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useEnter } from './people.queries.ts';

/** Registering a shop, with its owner. */
export function RegisterForm({ onEntered }: { onEntered: () => void }) {
  const enter = useEnter();
  const sheet = useSheetForm({
    schema: peopleApi.register.body,
    defaultValues: { shopName: '', name: '', email: '', password: '', units: 'in' },
    send: async (register) => {
      await enter.mutateAsync({ register });
      onEntered();
    },
  });
  const { register, formState } = sheet.form;
  const { errors } = formState;
  return (
    <form noValidate onSubmit={(event) => void sheet.submit(event)} className="grid gap-4">
      <TextField label="Name of the shop" autoComplete="organization" error={errors.shopName?.message} {...register('shopName')} />
      <TextField label="Your name" autoComplete="name" error={errors.name?.message} {...register('name')} />
      <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...register('email')} />
      <TextField label="Password" type="password" autoComplete="new-password" hint="At least 10 characters." error={errors.password?.message} {...register('password')} />
      <SelectField
        label="Lengths are shown in"
        hint="Either can be typed anywhere."
        options={[
          { value: 'in', words: 'Inches and fractions' },
          { value: 'mm', words: 'Millimetres' },
        ]}
        error={errors.units?.message}
        {...register('units')}
      />
      {sheet.failure ? <ErrorState error={sheet.failure} /> : null}
      <Button type="submit" weight="primary" busy={sheet.sending}>
        Register the shop
      </Button>
    </form>
  );
}
