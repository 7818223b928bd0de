import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Empty } from '@/components/ui/empty';
import { TextField } from '@/components/ui/field';
import { TextLink } from '@/components/ui/link-button';
import { Paging } from '@/components/ui/paging';
import { Select } from '@/components/ui/select';
import { Table } from '@/components/ui/table';
import { Tag } from '@/components/ui/tag';
import { formatMoney } from '@/services/money';
import { PART_KINDS, type PartPage, type PartView, partKinds } from '@/services/parts/schemas';
import { grouped } from '@/services/quantity';
import { PartPicture } from './part-picture';
import { partWords } from './part-words';

export interface PartSearch {
  q: string;
  kind: string;
  after: string;
  retired: boolean;
}

/** The catalogue of parts: a search that stays in the address, and a page of rows. */
export function PartTable({ page, search }: { page: PartPage; search: PartSearch }) {
  const { q, kind, after, retired } = search;
  return (
    <>
      <form
        method="get"
        action="/bench/parts"
        role="search"
        className="mb-5 grid items-end gap-4 sm:grid-cols-[minmax(0,1fr)_15rem_auto]"
      >
        <TextField label="Code or name" name="q" type="search" maxLength={80} defaultValue={q} />
        <Select
          label="Kind"
          name="kind"
          defaultValue={kind}
          placeholder="Every kind"
          options={PART_KINDS.map((one) => ({ value: one, label: partKinds[one].label }))}
        />
        {retired && <input type="hidden" name="retired" value="1" />}
        <Button type="submit" icon="search">
          Find
        </Button>
      </form>
      {page.parts.length === 0 ? (
        <Empty title={q === '' ? 'No part here' : `No part matches "${q}"`}>
          Try fewer words or another kind, or add it as a part.
        </Empty>
      ) : (
        <Table caption="Parts" rows={page.parts} rowKey={({ id }) => id} columns={columns} density="tight" />
      )}
      <div className="flex flex-wrap items-center justify-between gap-4">
        <Paging
          words={['First page', 'Further parts']}
          newerHref={after === '' ? undefined : addressOf({ ...search, after: '' })}
          olderHref={page.next === null ? undefined : addressOf({ ...search, after: page.next })}
        />
        <p className="ml-auto pt-3">
          <TextLink href={addressOf({ ...search, after: '', retired: !retired })}>
            {retired ? 'Without retired parts' : 'With retired parts'}
          </TextLink>
        </p>
      </div>
    </>
  );
}

const columns = [
  {
    key: 'picture',
    head: 'Drawing',
    headHidden: true,
    className: 'w-14 max-sm:hidden!',
    cell: ({ values }: PartView) => <PartPicture values={values} width={40} />,
  },
  {
    key: 'code',
    head: 'Code',
    isRowHead: true,
    cell: ({ id, code }: PartView) => (
      <Link
        href={`/bench/parts/${id}`}
        className="link inline-flex min-h-target items-center font-figures font-semibold"
      >
        {code}
      </Link>
    ),
  },
  {
    key: 'name',
    head: 'Name',
    cell: ({ name, values, retired }: PartView) => (
      <>
        <span className="font-semibold">{name}</span> {retired && <Tag tone="dashed">Retired</Tag>}
        <span className="block text-caption text-ink2">{partWords(values).detail}</span>
      </>
    ),
  },
  { key: 'kind', head: 'Kind', cell: ({ values }: PartView) => partKinds[values.kind].label },
  {
    key: 'value',
    head: 'Value',
    align: 'right' as const,
    cell: ({ values }: PartView) => {
      const { value, unit, tolerance } = partWords(values);
      if (value === undefined) return <span className="text-caption text-ink2">no value</span>;
      return (
        <span className="whitespace-nowrap">
          <span className="font-figures font-semibold">{value}</span>
          <span className="ml-1 inline-block w-7 text-left text-head text-ink2">{unit}</span>
          <span className="inline-block w-14 text-left text-head text-ink2">
            {tolerance === null ? '' : `±${tolerance} %`}
          </span>
        </span>
      );
    },
  },
  {
    key: 'cost',
    head: 'Cost',
    figures: true,
    cell: ({ cost, unit }: PartView) => (
      <>
        {formatMoney(cost)}
        <span className="ml-1 inline-block w-7 text-left font-text text-head font-normal text-ink2">
          {perUnit[unit]}
        </span>
      </>
    ),
  },
  {
    key: 'stock',
    head: 'Available',
    figures: true,
    cell: ({ stock, unit }: PartView) => (
      <>
        {unit === 'each' ? grouped(stock.available) : grouped(Math.round(stock.available / 1000))}
        <span className="ml-1 inline-block w-5 text-left font-text text-head font-normal text-ink2">
          {stockUnit[unit]}
        </span>
      </>
    ),
  },
];

const perUnit = { each: '', metre: 'a m', gram: 'a g' } as const;
const stockUnit = { each: '', metre: 'm', gram: 'g' } as const;

function addressOf({ q, kind, after, retired }: PartSearch): string {
  const query = new URLSearchParams();
  if (q !== '') query.set('q', q);
  if (kind !== '') query.set('kind', kind);
  if (after !== '') query.set('after', after);
  if (retired) query.set('retired', '1');
  const text = query.toString();
  return text === '' ? '/bench/parts' : `/bench/parts?${text}`;
}
