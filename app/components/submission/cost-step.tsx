import { Field } from "@/app/components/ui/field";
import { Ledger } from "@/app/components/ui/ledger";
import { TextInput } from "@/app/components/ui/text-input";
import type { FieldBinding } from "./field-binding";
import { Step } from "./step";
import type { RowsAction, UploadRow } from "./upload-rows";

const columns = [
  { field: "unknowns", label: "Unknowns", placeholder: "as many as nodes" },
  { field: "dt", label: "Time step", placeholder: "1e-4" },
  { field: "steps", label: "Steps", placeholder: "10000" },
] as const;

interface CostStepProps extends FieldBinding {
  rows: UploadRow[];
  isSending: boolean;
  onChange: (action: RowsAction) => void;
}

export function CostStep({ bind, errorOf, rows, isSending, onChange }: CostStepProps) {
  return (
    <Step id="cost" title="Cost" remark="declared by you and labelled so">
      <div className="grid gap-x-7 sm:grid-cols-2 lg:grid-cols-3">
        <Field
          label="Yardstick time"
          error={errorOf("yardstick")}
          hint="The kit's kernel on the same machine; it may be left out."
        >
          <TextInput {...bind("yardstick")} className="font-figure" placeholder="9.5 ms" />
        </Field>
      </div>
      {rows.length > 0 ? (
        <details className="text-14">
          <summary className="w-max cursor-pointer underline decoration-ink-3 underline-offset-3">
            Unknowns, time step and steps of each run
          </summary>
          <div className="mt-2.5 overflow-x-auto">
            <Ledger caption="Cost of each run" isCaptionHidden>
              <thead>
                <tr>
                  <th scope="col">File</th>
                  {columns.map((column) => (
                    <th key={column.field} scope="col" className="num">
                      {column.label}
                    </th>
                  ))}
                </tr>
              </thead>
              <tbody>
                {rows.map((row) => (
                  <tr key={row.name}>
                    <th scope="row" className="font-figure">
                      {row.name}
                    </th>
                    {columns.map(({ field, label, placeholder }) => (
                      <td key={field} className="num">
                        <TextInput
                          value={row[field]}
                          disabled={isSending}
                          placeholder={placeholder}
                          aria-label={`${label} of ${row.name}`}
                          className="w-32 px-2 py-1 text-right font-figure text-13"
                          onChange={(event) =>
                            onChange({ type: "change", name: row.name, field, value: event.target.value })
                          }
                        />
                      </td>
                    ))}
                  </tr>
                ))}
              </tbody>
            </Ledger>
          </div>
        </details>
      ) : null}
    </Step>
  );
}
