const day = new Intl.DateTimeFormat("en-GB", {
  day: "numeric",
  month: "long",
  year: "numeric",
  timeZone: "UTC",
});

/** "12 May 2026", the same on the server and in every browser; the exact time on hover and for machines. */
export function Moment({ at }: { at: Date }) {
  const iso = at.toISOString();
  return (
    <time dateTime={iso} title={`${iso.slice(0, 16).replace("T", " ")} UTC`}>
      {day.format(at)}
    </time>
  );
}
