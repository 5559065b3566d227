/** First stop of the keyboard: past the navigation, to the page. */
export const SkipLink = () => (
  <a
    href="#content"
    data-skip-link
    className="absolute top-2 left-2 z-50 -translate-y-20 rounded-control bg-tarn px-4 py-2 font-semibold text-surface focus:translate-y-0"
  >
    Skip to the page
  </a>
);
