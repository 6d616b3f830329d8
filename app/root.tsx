import regular from "@fontsource/noto-sans/files/noto-sans-latin-400-normal.woff2?url";
import medium from "@fontsource/noto-sans/files/noto-sans-latin-500-normal.woff2?url";
import semibold from "@fontsource/noto-sans/files/noto-sans-latin-600-normal.woff2?url";
import {
  isRouteErrorResponse,
  Links,
  Meta,
  Outlet,
  Scripts,
  ScrollRestoration,
  useRouteLoaderData,
} from "react-router";
import stylesheet from "./app.css?url";
import { ErrorPage } from "./components/layout/ErrorPage.tsx";
import { DEFAULT_PREFERENCES, type Preferences } from "./lib/preferences.ts";
import { bearer } from "./middleware/bearer.server.ts";
import { originCheck } from "./middleware/origin-check.server.ts";
import { requestLog } from "./middleware/request-log.server.ts";
import { securityHeaders } from "./middleware/security-headers.server.ts";
import { session } from "./middleware/session.server.ts";
import { nonceContext } from "./server/contexts.server.ts";
import type { Route } from "./+types/root";

export const middleware: Route.MiddlewareFunction[] = [requestLog, securityHeaders, bearer, originCheck, session];

/** Every page needs these three; without being named here they would be found only once the style sheet is read. */
const FONTS = [regular, medium, semibold];

export const links: Route.LinksFunction = () => [
  ...FONTS.map((href) => ({
    rel: "preload" as const,
    as: "font" as const,
    type: "font/woff2",
    href,
    crossOrigin: "anonymous" as const,
  })),
  { rel: "stylesheet", href: stylesheet },
  { rel: "icon", href: "/mark.svg", type: "image/svg+xml" },
  { rel: "apple-touch-icon", href: "/icon-180.png" },
  { rel: "manifest", href: "/planeward.webmanifest" },
];

export function loader({ context }: Route.LoaderArgs) {
  return { nonce: context.get(nonceContext) };
}

/** The nonce belongs to the page that was served: a later navigation must not replace it. */
export const shouldRevalidate = () => false;

interface Framed {
  mine: { preferences: Preferences };
}

/** The preferences of whoever is signed in; at the door, those that are delivered. */
function usePreferences(): Preferences {
  const framed = useRouteLoaderData<Framed>("routes/_app/layout");
  const printed = useRouteLoaderData<Framed>("routes/_print/layout");
  const floor = useRouteLoaderData<Framed>("routes/_floor/layout");
  return (framed ?? printed ?? floor)?.mine.preferences ?? DEFAULT_PREFERENCES;
}

export function Layout({ children }: { children: React.ReactNode }) {
  const nonce = useRouteLoaderData<typeof loader>("root")?.nonce;
  const { theme, density } = usePreferences();
  return (
    <html lang="en" data-theme={theme === "system" ? undefined : theme} data-density={density}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content={theme === "system" ? "light dark" : theme} />
        <Meta />
        <Links nonce={nonce} />
      </head>
      <body>
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
    <main className="mx-auto max-w-page p-6">
      <ErrorPage status={isRouteErrorResponse(error) ? error.status : 500} error={error} />
    </main>
  );
}
