/** The first stop of the Tab key: past the header, to the page's own matter (`<main id="main">`). */
export function SkipLink() {
  return (
    <a
      href="#main"
      className="fixed top-2 left-2 z-50 -translate-y-20 border-2 border-ink bg-sheet px-4 py-2 font-bold text-ink focus:translate-y-0"
    >
      Go to the page itself
    </a>
  )
}
