import { useState } from "react";

/** Copies a text; says so in its own place. Without a script it is not shown, and the text can be selected. */
export function CopyButton({ text, label = "Copy" }: { text: string; label?: string }) {
  const [copied, setCopied] = useState<"no" | "yes" | "refused">("no");
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setCopied("yes");
    } catch {
      // The browser may withhold the clipboard; the text beside the button can be selected instead.
      setCopied("refused");
    }
  };
  return (
    <button
      type="button"
      className="txtb text-13 [@media(scripting:none)]:hidden"
      onClick={() => void copy()}
    >
      <span aria-live="polite">
        {copied === "yes" ? "Copied" : copied === "refused" ? "Select it" : label}
      </span>
      <span className="sr-only"> {text}</span>
    </button>
  );
}
