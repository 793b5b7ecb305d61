/** The first stop of the Tab key: past the navigation, to the page. */
export function SkipLink() {
  return (
    <button
      type="button"
      className="fixed top-2 left-2 z-50 rounded bg-ink px-4 py-3 font-extrabold text-ground not-focus:sr-only"
      onClick={() => document.getElementById('main')?.focus()}
    >
      To the page
    </button>
  );
}
