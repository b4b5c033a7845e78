/** Mathematics that a loader has typeset. */
export function Formula({ markup, isBlock = false }: { markup: string; isBlock?: boolean }) {
  return isBlock ? (
    <div className="mathblock" dangerouslySetInnerHTML={{ __html: markup }} />
  ) : (
    <span dangerouslySetInnerHTML={{ __html: markup }} />
  );
}
