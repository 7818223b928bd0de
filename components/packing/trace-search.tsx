import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';

/** Asks for a box serial or a lot's code; a plain form, so that a scanner's Enter sends it. */
export function TraceSearch({ code, problem }: { code: string; problem: string }) {
  return (
    <form action="/packing/trace" method="get" role="search" className="flex flex-wrap items-end gap-4">
      <h1 className="w-full font-display text-page">Trace</h1>
      <TextField
        label="Box serial or lot code"
        hint="Scan the label, or type it."
        name="code"
        defaultValue={code}
        error={problem === '' ? undefined : problem}
        size="floor"
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        autoFocus
        className="font-figures uppercase"
        frameClassName="w-full max-w-xl"
      />
      <Button type="submit" variant="primary" size="floor" icon="search">
        Trace it
      </Button>
    </form>
  );
}
