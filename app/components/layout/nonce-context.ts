import { createContext } from "react";

/** The nonce of the answer being written; empty in the browser, which hides nonces from scripts. */
export const NonceContext = createContext("");
