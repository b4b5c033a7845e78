import { useId, useState } from "react";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";

/** The one time that a token is shown. Selecting it works where scripts do not. */
export function NewSecret({ name, secret }: { name: string; secret: string }) {
  const id = useId();
  const [copied, setCopied] = useState<"no" | "yes" | "refused">("no");
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(secret);
      setCopied("yes");
    } catch {
      // The browser may withhold the clipboard; the text can be selected instead.
      setCopied("refused");
    }
  };
  return (
    <Notice tone="ok">
      <p>
        The token <b>{name}</b> is made. This is the only time that it is shown.
      </p>
      <p className="flex flex-wrap items-center gap-3 pt-2">
        <code id={id} className="font-figure text-14 break-all whitespace-normal select-all">
          {secret}
        </code>
        <Button type="button" onClick={copy} aria-describedby={id}>
          Copy
        </Button>
        <span role="status" className="text-13">
          {copied === "yes" ? "Copied." : copied === "refused" ? "Select the token and copy it." : ""}
        </span>
      </p>
    </Notice>
  );
}
