import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';

/** A plain form: the scanner types a label and presses Enter, and it works before any script does. */
export function StoreSearch({ q }: { q: string }) {
  return (
    <form action="/store" role="search" className="flex max-w-160 items-end gap-3">
      <TextField
        label="Find a part, a lot or a bin"
        name="q"
        type="search"
        size="floor"
        defaultValue={q}
        frameClassName="flex-1"
      />
      <Button type="submit" size="floor" icon="search">
        Find
      </Button>
    </form>
  );
}
