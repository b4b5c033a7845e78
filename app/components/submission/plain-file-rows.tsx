import { runRoles } from "@/drizzle/enums";
import { roleNames } from "./role-names";

const rows = Array.from({ length: 8 }, (_, row) => row + 1);
const control = "w-full border border-hair border-b-ink-2 bg-sheet px-2 py-1.5 font-figure text-14";

/** Without a script: one row a file. A row without N is not used, and the files go in the order of their rows. */
export function PlainFileRows() {
  return (
    <noscript>
      <div className="mt-4 grid gap-2">
        <p className="text-14">Choose one file in each row and give its N. Rows without N are left out.</p>
        {rows.map((row) => (
          <fieldset
            key={row}
            className="grid gap-2 border-b border-hair-2 pb-2 md:grid-cols-[2fr_1fr_1fr_1fr]"
          >
            <legend className="text-13">Run {row}</legend>
            <input type="file" name="files" aria-label={`File of run ${row}`} className="text-14" />
            <input name="n" placeholder="N" aria-label={`N of run ${row}`} className={control} />
            <select name="role" aria-label={`Role of run ${row}`} className={control}>
              {runRoles.map((role) => (
                <option key={role} value={role}>
                  {roleNames[role]}
                </option>
              ))}
            </select>
            <input
              name="wall"
              placeholder="0.4 ms"
              aria-label={`Wall time of run ${row}`}
              className={control}
            />
            <input type="hidden" name="unknowns" value="" />
          </fieldset>
        ))}
      </div>
    </noscript>
  );
}
