import type { ReactNode } from "react";
import { Outlet, useMatches, useRouteLoaderData } from "react-router";
import { ErrorPage } from "@/app/components/layout/error-page";
import { Header } from "@/app/components/layout/header";
import { TitleBlock, type TitleBlockEntry } from "@/app/components/layout/title-block";
import type { loader as rootLoader } from "@/app/root";
import type { Route } from "./+types/layout";

export default function PageLayout() {
  return (
    <Frame>
      <Outlet />
    </Frame>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return (
    <Frame>
      <ErrorPage error={error} />
    </Frame>
  );
}

function Frame({ children }: { children: ReactNode }) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  const entry = useTitleBlockEntry();
  return (
    <>
      <Header viewer={root?.viewer ?? null} />
      <main id="main" className="wrap" tabIndex={-1}>
        {children}
      </main>
      {root ? <TitleBlock entry={entry} readOn={root.readOn} /> : null}
    </>
  );
}

/** A page exports `handle = { titleBlock: (loaderData) => entry }`, or nothing. */
function useTitleBlockEntry(): TitleBlockEntry {
  const matches = useMatches();
  for (const { handle, loaderData } of matches.toReversed()) {
    if (!hasTitleBlock(handle) || loaderData === undefined) continue;
    return handle.titleBlock(loaderData);
  }
  return { label: "Sheet", value: "Register" };
}

function hasTitleBlock(handle: unknown): handle is { titleBlock: (data: unknown) => TitleBlockEntry } {
  return typeof handle === "object" && handle !== null && "titleBlock" in handle;
}
