import { useWatch } from 'react-hook-form';
import { toast } from 'sonner';
import { peopleApi } from '../../../shared/people/people.api.ts';
import { type Role, roles } from '../../../shared/people/permissions.ts';
import { FormDialog } from '../../components/form-dialog.tsx';
import { SelectField } from '../../components/select-field.tsx';
import { TextField } from '../../components/text-field.tsx';
import { useSheetForm } from '../../lib/sheet-form.ts';
import { useAddMember } from './people.queries.ts';
import { roleWords } from './role-words.ts';

/** Adds a person to the shop. */
export function AddMemberDialog({ onClose }: { onClose: () => void }) {
  const add = useAddMember();
  const sheet = useSheetForm({
    schema: peopleApi.addMember.body,
    defaultValues: { name: '', email: '', role: 'maker' as Role, password: '' },
    send: async (body) => {
      const member = await add.mutateAsync(body);
      toast.success(`${member.name} can sign in now`);
      onClose();
    },
  });
  const { register, control, formState } = sheet.form;
  const role = useWatch({ control, name: 'role' });
  const { errors } = formState;
  return (
    <FormDialog title="Add a person" about="Tell them the first password yourself; it is not mailed." deed="Add the person" sheet={sheet} onClose={onClose}>
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...register('name')} />
      <TextField label="E-mail" type="email" autoComplete="off" error={errors.email?.message} {...register('email')} />
      <SelectField
        label="Role"
        options={roles.map((role) => ({ value: role, words: roleWords[role].name }))}
        hint={`Someone who ${roleWords[role as Role].does}.`}
        error={errors.role?.message}
        {...register('role')}
      />
      <TextField label="First password" autoComplete="new-password" hint="At least 10 characters." error={errors.password?.message} {...register('password')} />
    </FormDialog>
  );
}
