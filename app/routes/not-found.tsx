import { data } from "react-router";

/** A splat route, so that the root's middleware runs and an unknown address gets the whole frame. */
export function loader() {
  throw data(null, { status: 404 });
}

export default function NotFound() {
  return null;
}
