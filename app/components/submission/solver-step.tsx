import { FamilyKey } from "@/app/components/ui/family-mark";
import { Field } from "@/app/components/ui/field";
import { Radio } from "@/app/components/ui/radio";
import { Select } from "@/app/components/ui/select";
import { TextArea } from "@/app/components/ui/text-area";
import { TextInput } from "@/app/components/ui/text-input";
import { familyNames } from "@/app/components/ui/family-names";
import { claimKinds, methodFamilies } from "@/drizzle/enums";
import type { FieldBinding } from "./field-binding";
import { Step } from "./step";
import type { Team } from "./submit-state";

const claimNames: Record<(typeof claimKinds)[number], string> = {
  algebraic: "algebraic, of an order",
  exponential: "exponential",
  none: "nothing claimed",
};

interface SolverStepProps extends FieldBinding {
  teams: Team[];
  family: string;
  claim: string;
}

export function SolverStep({ bind, errorOf, teams, family, claim }: SolverStepProps) {
  return (
    <Step id="solver" title="Solver" remark="as it will stand in the register">
      <div className="grid gap-x-7 sm:grid-cols-2 lg:grid-cols-3">
        <Field label="Team" error={errorOf("team")}>
          <Select {...bind("team")}>
            {teams.map((team) => (
              <option key={team.slug} value={team.slug}>
                {team.name}
              </option>
            ))}
          </Select>
        </Field>
        <Field
          label="Solver"
          error={errorOf("solver")}
          hint="Lower-case letters, digits and hyphens; its address."
        >
          <TextInput {...bind("solver")} className="font-figure" autoComplete="off" spellCheck={false} />
        </Field>
        <Field label="Version" error={errorOf("version")}>
          <TextInput {...bind("version")} className="font-figure" autoComplete="off" />
        </Field>
      </div>
      <FamilyChoice bind={bind} errorOf={errorOf} family={family} />
      <div className="grid gap-x-7 sm:grid-cols-2 lg:grid-cols-3">
        <Field
          label="Method in a word"
          error={errorOf("method")}
          hint="The stencil or basis: central, upwind, quadratic."
        >
          <TextInput {...bind("method")} autoComplete="off" />
        </Field>
        <Field label="Convergence claimed" error={errorOf("claim")}>
          <Select {...bind("claim")}>
            {claimKinds.map((kind) => (
              <option key={kind} value={kind}>
                {claimNames[kind]}
              </option>
            ))}
          </Select>
        </Field>
        <Field
          label="Formal order"
          error={errorOf("formalOrder")}
          hint={
            claim === "algebraic"
              ? "Confirmed within 0.20 on the finest pairs."
              : "Only for an algebraic claim."
          }
        >
          <TextInput
            {...bind("formalOrder")}
            className="font-figure"
            inputMode="decimal"
            disabled={claim !== "algebraic"}
          />
        </Field>
      </div>
      <div className="grid gap-x-7 lg:grid-cols-3">
        <Field
          label="Name, if it differs from its address"
          error={errorOf("solverName")}
          hint="Used where the solver is new."
        >
          <TextInput {...bind("solverName")} autoComplete="off" />
        </Field>
        <div className="lg:col-span-2">
          <Field
            label="Method in one or two sentences"
            error={errorOf("description")}
            hint="Kept with a new version of the solver."
          >
            <TextArea {...bind("description")} rows={2} />
          </Field>
        </div>
      </div>
    </Step>
  );
}

function FamilyChoice({ bind, errorOf, family }: FieldBinding & { family: string }) {
  const { name, onChange } = bind("family");
  const error = errorOf("family");
  return (
    <fieldset className="mb-4" aria-describedby={error ? "family-error" : undefined}>
      <legend>Method family</legend>
      <div className="grid gap-x-7 border-y border-hair py-1.5 sm:grid-cols-2 lg:grid-cols-3">
        {methodFamilies.map((kind) => (
          <Radio key={kind} name={name} value={kind} checked={family === kind} onChange={onChange}>
            {familyNames[kind]}
            <FamilyKey family={kind} className="ml-auto" />
          </Radio>
        ))}
      </div>
      {error ? (
        <p id="family-error" className="mt-1 text-14 text-bad">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
