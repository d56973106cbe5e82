import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextInput } from '@/components/ui/text-input';
import type { Invitation } from '@/lib/schemas/person';

import { PasswordField } from './password-field';

type InvitationFormProps = {
  action: FormActionFunction<null>;
  token: string;
  invitation: Invitation;
};

export function InvitationForm({ action, token, invitation }: InvitationFormProps) {
  return (
    <Form action={action} label="Accept the invitation">
      <input type="hidden" name="token" value={token} />
      <Field label="E-mail" hint="The invitation holds for this address only.">
        <TextInput type="email" autoComplete="username" readOnly value={invitation.email} />
      </Field>
      {!invitation.known && (
        <Field label="Your name" name="name" required>
          <TextInput autoComplete="name" />
        </Field>
      )}
      <PasswordField fresh={!invitation.known} />
      <SubmitButton pendingLabel="Joining …">Join {invitation.teamName}</SubmitButton>
    </Form>
  );
}
