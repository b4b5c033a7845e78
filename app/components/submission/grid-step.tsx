import { Field } from "@/app/components/ui/field";
import { Select } from "@/app/components/ui/select";
import { TextInput } from "@/app/components/ui/text-input";
import type { Axis, ProblemDefinition } from "@/benchmarks/problems/definition";
import { precisions, valueKinds, type Precision, type ValueKind } from "@/drizzle/enums";
import type { FieldBinding } from "./field-binding";
import { gridFieldOf } from "./submit-state";

const valueNames: Record<ValueKind, string> = { point: "point values", cellAverage: "cell averages" };

const precisionNames: Record<Precision, string> = {
  float64: "double, eps 2.2e-16",
  float32: "single, eps 1.2e-7",
};

interface GridFieldsProps extends FieldBinding {
  problem: ProblemDefinition;
  reconstruction: string;
}

/** How the files hold the field: the kinds are those that the problem allows. */
export function GridFields({ bind, errorOf, problem, reconstruction }: GridFieldsProps) {
  const { axes, grids } = problem;
  return (
    <div className="grid gap-x-7 sm:grid-cols-2 lg:grid-cols-4">
      {axes.map((axis, i) => (
        <Field key={axis.name} label={gridLabel(axes, axis)} error={errorOf(gridFieldOf(axis.name))}>
          <Select {...bind(gridFieldOf(axis.name))}>
            {grids.kinds[i].map((kind) => (
              <option key={kind} value={kind}>
                {kind}
              </option>
            ))}
          </Select>
        </Field>
      ))}
      <Field label="Values" error={errorOf("values")}>
        <Select {...bind("values")}>
          {valueKinds.map((kind) => (
            <option key={kind} value={kind}>
              {valueNames[kind]}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Reconstruction between nodes" error={errorOf("reconstruction")}>
        <Select {...bind("reconstruction")}>
          <option value="none">none declared</option>
          {axes.some((axis) => axis.kind === "periodic") ? (
            <option value="trigonometric">trigonometric</option>
          ) : null}
          {axes.some((axis) => axis.kind === "bounded") ? (
            <option value="polynomial">polynomial</option>
          ) : null}
          <option value="piecewise-polynomial">piecewise polynomial</option>
        </Select>
      </Field>
      {reconstruction === "piecewise-polynomial" ? (
        <Field label="Degree, 1 to 7" error={errorOf("degree")}>
          <TextInput {...bind("degree")} inputMode="numeric" className="font-figure" />
        </Field>
      ) : null}
      <Field label="Precision" error={errorOf("precision")}>
        <Select {...bind("precision")}>
          {precisions.map((precision) => (
            <option key={precision} value={precision}>
              {precisionNames[precision]}
            </option>
          ))}
        </Select>
      </Field>
    </div>
  );
}

function gridLabel(axes: Axis[], axis: Axis): string {
  return axes.length === 1 ? "Grid kind" : `Grid kind along ${axis.name}`;
}
