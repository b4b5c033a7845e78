import { startTransition, StrictMode } from "react";
import { hydrateRoot } from "react-dom/client";
import { HydratedRouter } from "react-router/dom";
import { NonceContext } from "@/app/components/layout/nonce-context";

// Browsers hide the attribute, not the property: what hydrates is what was sent.
const nonce = document.querySelector<HTMLElement>("script[nonce]")?.nonce ?? "";

startTransition(() => {
  hydrateRoot(
    document,
    <StrictMode>
      <NonceContext value={nonce}>
        <HydratedRouter />
      </NonceContext>
    </StrictMode>,
  );
});
