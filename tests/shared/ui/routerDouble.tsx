/** Stands in for expo-router under jsdom, where its native screens cannot load: real addresses, recorded moves. */
import { cloneElement, isValidElement } from 'react';
import type { ReactElement, ReactNode } from 'react';

type Address = string | { pathname: string; params?: Record<string, string> };

/** What was asked of the router, in order; empty it before a test. */
export const moves: { how: 'push' | 'replace' | 'back' | 'redirect'; to: string | null }[] = [];

/** Parameters that the route under test reads. */
export const routeParams: Record<string, string> = {};

function written(href: Address): string {
  if (typeof href === 'string') return href;
  return Object.entries(href.params ?? {}).reduce(
    (path, [name, value]) => path.replace(`[${name}]`, encodeURIComponent(value)),
    href.pathname,
  );
}

const router = {
  push: (to: Address) => void moves.push({ how: 'push', to: written(to) }),
  replace: (to: Address) => void moves.push({ how: 'replace', to: written(to) }),
  navigate: (to: Address) => void moves.push({ how: 'push', to: written(to) }),
  setParams: (params: Record<string, string>) => void Object.assign(routeParams, params),
  back: () => void moves.push({ how: 'back', to: null }),
  canGoBack: () => true,
};

/** The router of the page. */
export function useRouter() {
  return router;
}

/** Parameters set by the test. */
export function useLocalSearchParams() {
  return routeParams;
}

/** Address of the page under test. */
export function usePathname() {
  return '/';
}

/** An anchor with the address that the real link would have. */
export function Link({ href, asChild, children }: { href: Address; asChild?: boolean; children: ReactNode }) {
  if (asChild && isValidElement(children)) return cloneElement(children as ReactElement<{ href: string }>, { href: written(href) });
  return <a href={written(href)}>{children}</a>;
}

/** Records where it would lead. */
export function Redirect({ href }: { href: Address }) {
  moves.push({ how: 'redirect', to: written(href) });
  return null;
}
