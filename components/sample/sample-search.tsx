import { Button } from '@/components/ui/button';
import { TextInput } from '@/components/ui/text-input';
import { TextLink } from '@/components/ui/text-link';

type SampleSearchProps = { words: string; archived: boolean };

/** A plain form over the address: what is found can be shared as a link. */
export function SampleSearch({ words, archived }: SampleSearchProps) {
  return (
    <div className="no-print flex flex-wrap items-center gap-x-4 gap-y-2 py-4">
      <form
        role="search"
        action="/samples"
        className="flex min-w-0 flex-1 basis-full gap-2 sm:max-w-sm sm:basis-auto"
      >
        {archived && <input type="hidden" name="archived" value="yes" />}
        <TextInput
          type="search"
          name="q"
          aria-label="Words in name, material or treatment"
          placeholder="Name, material, treatment"
          defaultValue={words}
        />
        <Button type="submit">Find</Button>
      </form>
      <TextLink href={archived ? '/samples' : '/samples?archived=yes'} className="ml-auto text-sm">
        {archived ? 'Samples in use' : 'Archived samples'}
      </TextLink>
    </div>
  );
}
