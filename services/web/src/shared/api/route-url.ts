import type { RouteKey } from '@noonwell/schema';

type ParamName<Route extends string> = Route extends `${string}{${infer Name}}${infer Rest}`
  ? Name | ParamName<Rest>
  : never;

/** The path parameters that a route needs: required where it has some, absent where it has none. */
export type RouteParams<Route extends RouteKey> = [ParamName<Route>] extends [never]
  ? { params?: undefined }
  : { params: Readonly<Record<ParamName<Route>, string>> };

export type QueryValues = Readonly<Record<string, string | number | boolean | undefined>>;

/** Method and address of a route of the shared route table. */
export function routeRequest(
  route: RouteKey,
  params: Readonly<Record<string, string>> | undefined,
  query?: QueryValues,
): { method: string; url: string } {
  const space = route.indexOf(' ');
  const path = route.slice(space + 1).replace(/\{(\w+)\}/g, (_, name: string) => {
    const value = params?.[name];
    if (value === undefined) throw new Error(`${route} needs the parameter ${name}`);
    return encodeURIComponent(value);
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value !== undefined) search.set(name, String(value));
  }
  return {
    method: route.slice(0, space),
    url: search.size === 0 ? path : `${path}?${search.toString()}`,
  };
}
