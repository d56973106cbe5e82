import { Button } from '@/components/ui/button';
import { TextInput } from '@/components/ui/text-input';

/** A plain form over the address: what is found can be shared as a link. */
export function ProfileSearch({ words }: { words: string }) {
  return (
    <form role="search" action="/profiles" className="no-print flex min-w-0 gap-2 py-4 sm:max-w-md">
      <TextInput
        type="search"
        name="q"
        maxLength={200}
        aria-label="Words in number, sample, material, scan or fit"
        placeholder="Number, sample, material"
        defaultValue={words}
      />
      <Button type="submit">Find</Button>
    </form>
  );
}
