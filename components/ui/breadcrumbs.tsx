import Link from 'next/link';

export type BreadcrumbsProps = { trail: readonly { href: string; label: string }[]; here: string };

export function Breadcrumbs({ trail, here }: BreadcrumbsProps) {
  return (
    <nav aria-label="Where you are" className="py-3 text-caption text-ink2">
      <ol className="flex flex-wrap gap-x-2.5 gap-y-1">
        {trail.map(({ href, label }) => (
          <li key={href} className="flex gap-2.5">
            <Link href={href} className="link relative before:absolute before:-inset-y-3 before:inset-x-0">
              {label}
            </Link>
            <span aria-hidden>/</span>
          </li>
        ))}
        <li aria-current="page">{here}</li>
      </ol>
    </nav>
  );
}
