/**
 * Loads a page whole instead of moving there within the app: after somebody signs in or out, or takes another party in
 * hand, nothing that was read before may stay in the page's memory.
 */
export function loadPage(path: string): void {
  window.location.assign(path)
}
