import { pageQuerySchema } from '@noonwell/schema';

/** The page of a list that the address names; the first where it names none that can be. */
export function pageOfAddress(search: URLSearchParams): number {
  const parsed = pageQuerySchema.shape.page.safeParse(search.get('page') ?? undefined);
  return parsed.success ? parsed.data : 1;
}
