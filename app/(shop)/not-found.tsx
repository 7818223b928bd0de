import { LinkButton } from '@/components/ui/link-button';

/** Under the shop's own bar. An order that is somebody else's looks like one that is not there. */
export default function ShopNotFound() {
  return (
    <main id="main" className="mx-auto max-w-page px-4 py-10 sm:px-6">
      <h1 className="font-display text-page">Nothing stands here for you</h1>
      <p className="mt-2 max-w-measure text-lead">
        A kit may have left the catalogue. An order opens from the link in its mail, or under My orders when you have
        signed in with the address it was ordered with.
      </p>
      <div className="mt-5 flex flex-wrap gap-3">
        <LinkButton href="/" variant="primary">
          See the kits
        </LinkButton>
        <LinkButton href="/orders">My orders</LinkButton>
      </div>
    </main>
  );
}
