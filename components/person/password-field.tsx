import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';

/** A new password, or the one that the person has. */
export function PasswordField({ fresh = false }: { fresh?: boolean }) {
  return (
    <Field
      label="Password"
      name="password"
      required
      hint={fresh ? 'At least 10 characters.' : undefined}
    >
      <TextInput type="password" autoComplete={fresh ? 'new-password' : 'current-password'} />
    </Field>
  );
}
