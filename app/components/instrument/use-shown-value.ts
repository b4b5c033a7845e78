import { useState } from "react";

/** A control's value: what the address says, and in between what the reader has just set. */
export function useShownValue<T>(fromAddress: T): [T, (value: T) => void] {
  const [known, setKnown] = useState(fromAddress);
  const [value, setValue] = useState(fromAddress);
  if (JSON.stringify(known) !== JSON.stringify(fromAddress)) {
    setKnown(fromAddress);
    setValue(fromAddress);
    return [fromAddress, setValue];
  }
  return [value, setValue];
}
