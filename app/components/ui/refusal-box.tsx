import type { Refusal } from "@/benchmarks/scoring/data-error";

/** What was refused: the file, the place in it, and the sentence. */
export function RefusalBox({ refusals }: { refusals: readonly Refusal[] }) {
  if (refusals.length === 0) return null;
  return (
    <ul className="my-4 grid gap-3">
      {refusals.map((refusal) => (
        <li
          key={`${refusal.file} ${refusal.code} ${refusal.message}`}
          className="border-l-3 border-bad bg-bad-wash px-4 py-2.5 text-14"
        >
          {refusal.file ? <code className="font-medium">{refusal.file}</code> : null}
          {refusal.where ? <span className="ml-2 text-13 text-ink-2">{refusal.where}</span> : null}
          <p className="text-pretty">{refusal.message}</p>
          <p className="fig text-12 text-ink-2">{refusal.code}</p>
        </li>
      ))}
    </ul>
  );
}
