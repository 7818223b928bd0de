import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { TextField } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { Table } from '@/components/ui/table';
import { Initials } from '@/components/ui/tag';

const render = renderToStaticMarkup;
const attribute = (markup: string, name: string) => new RegExp(`${name}="([^"]*)"`).exec(markup)?.[1];

describe('a locked button', () => {
  const locked = render(
    <Button type="submit" name="deed" value="release" lockedReason="One finding stops it">
      Release 4 G
    </Button>,
  );

  it('stays in reach of the keyboard and reads its reason out', () => {
    expect(locked).not.toMatch(/ disabled|tabindex/);
    expect(locked).toContain('aria-disabled="true"');
    const reasonId = attribute(locked, 'aria-describedby');
    expect(locked).toContain(`id="${reasonId}"`);
    expect(locked).toContain('One finding stops it');
  });

  it('cannot send its form', () => {
    expect(locked).toContain('type="button"');
    expect(locked).not.toContain('value="release"');
  });
});

describe('a button under way', () => {
  it('says that it is busy and cannot send its form again', () => {
    const pending = render(
      <Button type="submit" pending pendingLabel="Releasing">
        Release 4 G
      </Button>,
    );
    expect(pending).toContain('aria-busy="true"');
    expect(pending).toContain('type="button"');
    expect(pending).toContain('Releasing');
  });
});

describe('a field', () => {
  const error = 'Smaller than its least value, 8 to 365 pF. Did you mean 365?';

  it.each([
    ['text', render(<TextField label="Largest" hint="In picofarad" error={error} unit="pF" />)],
    [
      'choice',
      render(<Select label="Largest" hint="In picofarad" error={error} options={[{ value: 'a', label: 'A' }]} />),
    ],
    ['box to tick', render(<Checkbox label="Largest" hint="In picofarad" error={error} />)],
  ])('of %s ties label, hint and error to it', (_, markup) => {
    const id = attribute(markup, 'for');
    expect(markup).toMatch(new RegExp(`<(input|select)[^>]* id="${id}"`));
    const described = attribute(markup, 'aria-describedby')?.split(' ') ?? [];
    expect(described).toHaveLength(2);
    for (const part of described) expect(markup).toContain(`id="${part}"`);
    expect(markup).toContain('aria-invalid="true"');
  });

  it('without an error is not called wrong', () => {
    const markup = render(<TextField label="Largest" />);
    expect(markup).not.toContain('aria-invalid');
    expect(markup).not.toContain('aria-describedby');
  });
});

describe('a table', () => {
  const markup = render(
    <Table
      caption="Kits on sale"
      rows={[{ name: 'Ebb Lamp', sold: 38 }]}
      rowKey={(row) => row.name}
      columns={[
        { key: 'name', head: 'Kit', isRowHead: true, cell: (row) => row.name },
        {
          key: 'sold',
          head: 'Sold',
          figures: true,
          cell: (row) => row.sold,
          sort: { href: '?sort=sold', direction: 'descending' },
        },
      ]}
    />,
  );

  it('says which way it is sorted, by attribute and in words', () => {
    expect(markup).toContain('aria-sort="descending"');
    expect(markup).toContain('high first');
  });

  it('gives each cell its column name for phones', () => {
    expect(markup).toContain('data-name="Sold"');
  });
});

describe('initials', () => {
  it('are the first letters of first and last name, and read as the whole name', () => {
    const markup = render(<Initials name="Isolde van Hark" />);
    expect(markup).toContain('>IH<');
    expect(markup).toContain('Isolde van Hark');
  });
});
