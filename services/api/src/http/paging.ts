import { pageQuerySchema, idSchema, type PageQuery } from '@noonwell/schema';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

export class PageQueryDto extends createZodDto(pageQuerySchema) {}
export class IdParamsDto extends createZodDto(z.strictObject({ id: idSchema })) {}

export interface Page<Item> {
  readonly items: Item[];
  readonly page: number;
  readonly pageSize: number;
  readonly total: number;
}

/** What MikroORM's find needs for a page. */
export const window = ({ page, pageSize }: PageQuery) => ({ limit: pageSize, offset: (page - 1) * pageSize });

export function pageOfRows<Row, Item>(
  query: PageQuery,
  [rows, total]: readonly [readonly Row[], number],
  view: (row: Row) => Item,
): Page<Item> {
  return { items: rows.map(view), page: query.page, pageSize: query.pageSize, total };
}
