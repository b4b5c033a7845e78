import { createContext } from "react";

/** The nonce of the answer that the page came with. */
export const NonceContext = createContext("");
