import { Icon } from '@/components/ui/icon';

/** On phones the bar has no room for it, so the catalogue shows it over its cards. A plain form: it needs no script. */
export function SearchBox({ q }: { q: string }) {
  return (
    <form action="/" role="search" className="flex gap-2 sm:hidden">
      <label className="flex min-h-target flex-1 items-center gap-3 rounded-control border-1.5 border-edge bg-card px-3 focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-enamel">
        <Icon name="search" />
        <span className="sr-only">Find a kit or station</span>
        <input
          name="q"
          type="search"
          defaultValue={q}
          placeholder="Find a kit or station"
          className="min-w-0 flex-1 bg-transparent outline-none"
        />
      </label>
    </form>
  );
}
