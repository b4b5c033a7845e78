interface SegmentedProps<Value extends string> {
  legend: string;
  name: string;
  value: Value;
  options: readonly { value: Value; label: string }[];
  onChange?: (value: Value) => void;
}

/** A few exclusive choices in a row; radio buttons beneath, so that it works in a form without a script. */
export function Segmented<Value extends string>({
  legend,
  name,
  value,
  options,
  onChange,
}: SegmentedProps<Value>) {
  return (
    <fieldset>
      <legend>{legend}</legend>
      <div className="seg">
        {options.map((option) => (
          <label key={option.value}>
            <input
              type="radio"
              className="sr-only"
              name={name}
              value={option.value}
              defaultChecked={option.value === value}
              onChange={() => onChange?.(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
