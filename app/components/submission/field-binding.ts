import type { ChangeEvent } from "react";

type Control = HTMLInputElement | HTMLSelectElement | HTMLTextAreaElement;

/** Ties one control to its field; the names are those that a form without a script sends. */
export interface Binding {
  name: string;
  value: string;
  onChange: (event: ChangeEvent<Control>) => void;
}

export interface FieldBinding {
  bind: (name: string) => Binding;
  /** The sentence to show below the field; undefined where nothing is wrong with it. */
  errorOf: (name: string) => string | undefined;
}
