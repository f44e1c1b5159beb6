/** The first thing that Tab reaches: straight to what the page is about. */
export function SkipLink() {
  return (
    <a
      href="#main"
      className="sr-only focus:not-sr-only focus:absolute focus:start-3 focus:top-2 focus:z-30 focus:border focus:border-ink focus:bg-paper focus:px-3 focus:py-1.5"
      onClick={(event) => {
        event.preventDefault();
        document.getElementById('main')?.focus();
      }}
    >
      Skip to the content
    </a>
  );
}
