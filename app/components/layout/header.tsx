import { Form, Link, NavLink } from "react-router";
import type { Role } from "@/drizzle/enums";
import { ThemeToggle } from "./theme-toggle";
import { Wordmark } from "./wordmark";

/** What of the signed-in person the page frame shows. */
export interface FrameViewer {
  name: string;
  role: Role;
}

export function Header({ viewer }: { viewer: FrameViewer | null }) {
  return (
    <header>
      <div className="wrap head">
        <Link to="/" className="mark">
          <Wordmark />
        </Link>
        <nav className="nav" aria-label="Main">
          <NavLink to="/problems">Test problems</NavLink>
          <NavLink to="/records">Records</NavLink>
          <NavLink to="/scoring">Scoring</NavLink>
          {viewer ? <NavLink to="/submissions">Submissions</NavLink> : null}
          {viewer?.role === "admin" ? <NavLink to="/moderation">Moderation</NavLink> : null}
        </nav>
        <div className="head-r">
          {viewer ? <Signed name={viewer.name} /> : <Link to="/sign-in">Sign in</Link>}
          <ThemeToggle />
        </div>
      </div>
      <div className="grad" aria-hidden="true" />
    </header>
  );
}

function Signed({ name }: { name: string }) {
  return (
    <>
      <Link to="/account" className="max-w-44 overflow-hidden text-ellipsis">
        {name}
      </Link>
      <Form method="post" action="/sign-out">
        <button type="submit" className="txtb">
          Sign out
        </button>
      </Form>
    </>
  );
}
