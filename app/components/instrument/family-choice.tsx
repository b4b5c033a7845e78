import { Checkbox } from "@/app/components/ui/checkbox";
import { FamilyKey } from "@/app/components/ui/family-mark";
import { familyNames } from "@/app/components/ui/family-names";
import { type MethodFamily, methodFamilies } from "@/drizzle/enums";
import { useShownValue } from "./use-shown-value";

/** The filter is the chart's legend. None in the address stands for all. */
export function FamilyChoice({ chosen }: { chosen: MethodFamily[] }) {
  const [ticked, setTicked] = useShownValue<readonly MethodFamily[]>(
    chosen.length > 0 ? chosen : methodFamilies,
  );
  const isAll = ticked.length === methodFamilies.length;
  return (
    <fieldset className="filt">
      <legend>Method family</legend>
      {methodFamilies.map((family) => (
        <Checkbox
          key={family}
          // All ticked is said by saying nothing.
          name={isAll ? undefined : "family"}
          value={family}
          checked={ticked.includes(family)}
          onChange={(event) =>
            setTicked(event.target.checked ? [...ticked, family] : ticked.filter((one) => one !== family))
          }
        >
          {familyNames[family]}
          <FamilyKey family={family} className="ml-auto" />
        </Checkbox>
      ))}
    </fieldset>
  );
}
