import { ButtonLink } from '@/components/ui/button-link';

export function NothingHere() {
  return (
    <div className="grid prose-measure justify-items-start gap-3 py-12">
      <h1>Nothing at this address</h1>
      <p className="text-ink-2">
        The address may be mistyped, or it names something of another team. If somebody sent you the
        link, check that you are signed in to the team it belongs to.
      </p>
      <ButtonLink href="/">Go to the home page</ButtonLink>
    </div>
  );
}
