/** The first stop of the keyboard: past the navigation, to what the page is about. */
export function SkipLink() {
  return (
    <a
      href="#main"
      className="sr-only z-50 rounded-control bg-plate px-4 py-3 font-bold text-on-enamel focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
    >
      To the content
    </a>
  );
}
