import { type ReactNode, use } from "react";
import { Links, Meta, Outlet, Scripts, ScrollRestoration, useRouteLoaderData } from "react-router";
import { ErrorPage } from "@/app/components/layout/error-page";
import { Header } from "@/app/components/layout/header";
import { NonceContext } from "@/app/components/layout/nonce-context";
import { readTheme } from "@/app/components/layout/theme-choice";
import { viewerContext } from "@/app/http/session.server";
import { rootMiddleware } from "@/app/http/viewer-middleware.server";
import type { Route } from "./+types/root";
import "./app.css";

export const middleware: Route.MiddlewareFunction[] = rootMiddleware;

export const links: Route.LinksFunction = () => [
  { rel: "icon", type: "image/svg+xml", href: "/favicon.svg" },
];

export const meta: Route.MetaFunction = () => [
  { title: "Backsight" },
  {
    name: "description",
    content: "A shared register of solver accuracy on test problems with exact solutions.",
  },
];

export function loader({ request, context }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  return {
    theme: readTheme(request.headers.get("Cookie")),
    viewer: viewer ? { name: viewer.name, role: viewer.role } : null,
    readOn: new Date(),
  };
}

export function Layout({ children }: { children: ReactNode }) {
  const data = useRouteLoaderData<typeof loader>("root");
  const nonce = use(NonceContext);
  return (
    <html lang="en" data-theme={data?.theme ?? undefined} suppressHydrationWarning>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content="light dark" />
        <Meta />
        <Links nonce={nonce} />
      </head>
      <body>
        <a className="skip" href="#main">
          Skip to content
        </a>
        {children}
        <ScrollRestoration nonce={nonce} />
        <Scripts nonce={nonce} />
      </body>
    </html>
  );
}

export default function App() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return (
    <>
      <Header viewer={null} />
      <main id="main" className="wrap" tabIndex={-1}>
        <ErrorPage error={error} />
      </main>
    </>
  );
}
