import { type RefObject, useEffect } from "react";

/** Keys of the queue: n and p move the focus from row to row, e opens the evidence of the row that has it. */
export function useQueueKeys(table: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (!isPlainKey(event)) return;
      const links = [...(table.current?.querySelectorAll<HTMLAnchorElement>("a[data-evidence]") ?? [])];
      if (links.length === 0) return;
      const at = links.findIndex((link) => link.closest("tr")?.contains(document.activeElement));
      if (event.key === "n") links[Math.min(at + 1, links.length - 1)].focus();
      else if (event.key === "p") links[at < 0 ? 0 : Math.max(at - 1, 0)].focus();
      else if (event.key === "e") links[Math.max(at, 0)].click();
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, [table]);
}

/** Keys of one submission's page: each follows the link that names it. */
export function useReviewKeys(links: RefObject<HTMLElement | null>): void {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (!isPlainKey(event) || !/^[npe]$/.test(event.key)) return;
      links.current?.querySelector<HTMLAnchorElement>(`a[data-key="${event.key}"]`)?.click();
    };
    window.addEventListener("keydown", listen);
    return () => window.removeEventListener("keydown", listen);
  }, [links]);
}

/** A letter typed into a field, or with a modifier, is not a command. */
function isPlainKey(event: KeyboardEvent): boolean {
  if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return false;
  return !(
    event.target instanceof HTMLElement && event.target.closest("input, textarea, select, [contenteditable]")
  );
}
