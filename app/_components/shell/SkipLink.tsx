/** First stop of the keyboard: past the navigation, to the page. */
export function SkipLink() {
  return (
    <a href="#page" className="sr-only bg-card px-3 py-2 underline focus:not-sr-only focus:absolute focus:z-30 focus:m-2">
      Skip to the page
    </a>
  );
}
