import { NavLink } from "react-router";

const pages = [
  { to: "/account", label: "Profile" },
  { to: "/account/tokens", label: "API tokens" },
  { to: "/account/teams", label: "Teams" },
];

/** The pages of one's own account; the router marks the one that is open with aria-current. */
export function AccountNav() {
  return (
    <nav aria-label="Account" className="secnav">
      {pages.map((page) => (
        <NavLink key={page.to} to={page.to} end>
          {page.label}
        </NavLink>
      ))}
    </nav>
  );
}
