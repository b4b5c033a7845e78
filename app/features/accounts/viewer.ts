import type { ApiScope, Role } from "@/drizzle/enums";

/** Who asks: a signed-in person or the holder of an API token. Null stands for a visitor. */
export interface Account {
  userId: string;
  name: string;
  email: string;
  role: Role;
  isEmailVerified: boolean;
  teams: { id: string; slug: string; name: string }[];
  /** What an API token may do; null in a browser session, which may do all that the role may. */
  scopes: ApiScope[] | null;
  apiKeyId: string | null;
}

export type Viewer = Account | null;
