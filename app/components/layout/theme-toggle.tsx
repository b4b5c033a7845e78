import { type Theme, themeCookie } from "./theme-choice";

function shownTheme(): Theme {
  const chosen = document.documentElement.dataset.theme;
  if (chosen === "light" || chosen === "dark") return chosen;
  return matchMedia("(prefers-color-scheme: dark)").matches ? "dark" : "light";
}

function choose() {
  const theme: Theme = shownTheme() === "dark" ? "light" : "dark";
  document.documentElement.dataset.theme = theme;
  document.cookie = themeCookie(theme, location.protocol === "https:");
}

/** Named by the theme that it leads to; both names are sent, and style shows the right one. */
export function ThemeToggle() {
  return (
    <button type="button" className="txtb theme-toggle" onClick={choose}>
      <span className="to-dark">Dark</span>
      <span className="to-light">Light</span>
    </button>
  );
}
