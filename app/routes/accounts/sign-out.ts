import { redirect } from "react-router";
import { signOut } from "@/app/http/session.server";
import type { Route } from "./+types/sign-out";

/** A link must not sign anybody out. */
export function loader() {
  return new Response("Signing out takes POST.", { status: 405, headers: { Allow: "POST" } });
}

export async function action({ request }: Route.ActionArgs) {
  return redirect("/", { headers: await signOut(request) });
}
