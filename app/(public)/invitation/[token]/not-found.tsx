import { EmptyState } from '@/components/ui/empty-state';
import { ButtonLink } from '@/components/ui/button-link';

export default function InvitationNotFound() {
  return (
    <div className="py-10">
      <h1 className="mb-4">Invitation</h1>
      <EmptyState
        title="This invitation is not open any more."
        text={
          <p>It was used, withdrawn, or is too old. Ask the owner of the team for a new one.</p>
        }
        action={<ButtonLink href="/sign-in">Sign in</ButtonLink>}
      />
    </div>
  );
}
