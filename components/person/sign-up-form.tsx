import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextInput } from '@/components/ui/text-input';

import { PasswordField } from './password-field';

export function SignUpForm({ action }: { action: FormActionFunction<null> }) {
  return (
    <Form action={action} label="Sign up">
      <Field label="Your name" name="name" required>
        <TextInput autoComplete="name" />
      </Field>
      <Field label="E-mail" name="email" required>
        <TextInput type="email" autoComplete="username" spellCheck={false} />
      </Field>
      <PasswordField fresh />
      <Field
        label="Name of your team"
        name="teamName"
        required
        hint="You become its owner and can invite the others."
      >
        <TextInput autoComplete="organization" />
      </Field>
      <SubmitButton pendingLabel="Making the team …">Make the team</SubmitButton>
    </Form>
  );
}
