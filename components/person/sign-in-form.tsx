import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextInput } from '@/components/ui/text-input';

import { PasswordField } from './password-field';

type SignInFormProps = {
  action: FormActionFunction<null>;
  /** Where the person wanted to go. */
  next: string;
};

export function SignInForm({ action, next }: SignInFormProps) {
  return (
    <Form action={action} label="Sign in">
      <input type="hidden" name="next" value={next} />
      <Field label="E-mail" name="email" required>
        <TextInput type="email" autoComplete="username" spellCheck={false} />
      </Field>
      <PasswordField />
      <SubmitButton pendingLabel="Signing in …">Sign in</SubmitButton>
    </Form>
  );
}
