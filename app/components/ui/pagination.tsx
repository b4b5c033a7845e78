interface PaginationProps {
  /** What is shown, such as "50 of 320 records". */
  children: string;
  firstHref: string | null;
  nextHref: string | null;
}

/** Lists go forward by a cursor: to the next page, or back to the first. */
export function Pagination({ children, firstHref, nextHref }: PaginationProps) {
  return (
    <nav aria-label="Pages" className="flex flex-wrap items-baseline gap-x-6 gap-y-2 py-3 text-14">
      <span className="text-ink-2">{children}</span>
      {firstHref ? <a href={firstHref}>First page</a> : null}
      {nextHref ? (
        <a href={nextHref} rel="next">
          Next page
        </a>
      ) : null}
    </nav>
  );
}
