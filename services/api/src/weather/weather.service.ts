import { ForeignKeyConstraintViolationException } from '@mikro-orm/core';
import { EntityManager } from '@mikro-orm/postgresql';
import { HttpStatus, Injectable, Logger } from '@nestjs/common';
import { WeatherColumns, WeatherOriginal, WeatherYear, withWorkspace } from '@noonwell/persistence';
import type { PageQuery, WeatherYearView } from '@noonwell/schema';
import {
  decodeWeatherYear,
  encodeWeatherYear,
  readWeatherFile,
  type WeatherRefused,
} from '@noonwell/weather';
import { createHash } from 'node:crypto';
import { requirePermission, type Principal } from '../access/principal';
import { pageOfRows, window, type Page } from '../http/paging';
import { conflict, notFound, ProblemException } from '../http/problem';
import { weatherColumnsStream } from './weather-arrow';
import { firstUsableName } from './weather-names';
import { weatherYearView } from './weather-view';

export interface WeatherUpload {
  readonly bytes: Uint8Array;
  readonly fileName: string;
  /** What the person calls it; the file's own place name is taken otherwise. */
  readonly name: string | undefined;
}

export interface OriginalFile {
  readonly fileName: string;
  readonly bytes: Uint8Array;
}

@Injectable()
export class WeatherService {
  private readonly log = new Logger('weather');

  constructor(private readonly em: EntityManager) {}

  async list(principal: Principal, query: PageQuery): Promise<Page<WeatherYearView>> {
    requirePermission(principal, 'weather.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const rows = await em.findAndCount(
        WeatherYear,
        {},
        { populate: ['createdBy'], orderBy: { createdAt: 'desc', id: 'asc' }, ...window(query) },
      );
      return pageOfRows(query, rows, weatherYearView);
    });
  }

  async get(principal: Principal, id: string): Promise<WeatherYearView> {
    requirePermission(principal, 'weather.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) =>
      weatherYearView(await requireWeatherYear(em, id)),
    );
  }

  /** Reads the file here, whatever the browser made of it; the year, its columns and the file are saved together or not at all. */
  async add(principal: Principal, { bytes, fileName, name }: WeatherUpload): Promise<WeatherYearView> {
    requirePermission(principal, 'weather.write');
    // Here and not in a thread: the longest that any 64 MiB took was 0.2 s, because the reader stops at a year.
    const read = readWeatherFile(bytes, fileName);
    if (read.kind === 'refused') {
      this.log.log({ userId: principal.userId, problems: read.problemCount }, 'weather file refused');
      throw refusal(read, fileName);
    }
    const columns = encodeWeatherYear(read.year);
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const { workspaceId } = principal;
      const year = em.create(WeatherYear, {
        workspaceId,
        name: firstUsableName(name, read.header.placeName, fileName),
        format: read.format,
        synthetic: /\bsynthetic\b/i.test(read.header.source),
        latitudeDeg: read.year.latitudeDeg,
        longitudeDeg: read.year.longitudeDeg,
        altitudeM: read.year.altitudeM,
        utcOffsetHours: read.year.utcOffsetHours,
        originalFileName: fileName,
        originalBytes: bytes.length,
        originalSha256: createHash('sha256').update(bytes).digest('hex'),
        warnings: read.warnings,
        summary: read.summary,
        createdBy: principal.userId,
      });
      await em.flush();
      await em.insert(WeatherColumns, { weatherYearId: year.id, workspaceId, bytes: columns });
      await em.insert(WeatherOriginal, { weatherYearId: year.id, workspaceId, bytes });
      this.log.log({ userId: principal.userId, weatherYearId: year.id }, 'weather year added');
      return weatherYearView(await requireWeatherYear(em, year.id));
    });
  }

  async original(principal: Principal, id: string): Promise<OriginalFile> {
    requirePermission(principal, 'weather.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const year = await requireWeatherYear(em, id);
      const { bytes } = await em.findOneOrFail(WeatherOriginal, { weatherYearId: id });
      return { fileName: year.originalFileName, bytes };
    });
  }

  /** An Arrow IPC stream of the measured channels. */
  async columns(principal: Principal, id: string): Promise<Uint8Array> {
    requirePermission(principal, 'weather.read');
    const { bytes } = await withWorkspace(this.em, principal.workspaceId, async (em) => {
      await requireWeatherYear(em, id);
      return em.findOneOrFail(WeatherColumns, { weatherYearId: id });
    });
    return weatherColumnsStream(decodeWeatherYear(bytes));
  }

  /** Refused while a version or a run stands on it: results must stay explainable. */
  async remove(principal: Principal, id: string): Promise<void> {
    requirePermission(principal, 'weather.write');
    try {
      await withWorkspace(this.em, principal.workspaceId, async (em) => {
        if ((await em.nativeDelete(WeatherYear, { id })) === 0) throw notFound('weather year');
      });
    } catch (error) {
      if (!(error instanceof ForeignKeyConstraintViolationException)) throw error;
      throw conflict(
        'weather-in-use',
        'Versions of scenarios or runs stand on this weather year. Delete those studies or scenarios first.',
      );
    }
    this.log.log({ userId: principal.userId, weatherYearId: id }, 'weather year removed');
  }
}

/** @throws ProblemException 404, also for one of another workspace */
export async function requireWeatherYear(em: EntityManager, id: string): Promise<WeatherYear> {
  const year = await em.findOne(WeatherYear, { id }, { populate: ['createdBy'] });
  if (year === null) throw notFound('weather year');
  return year;
}

function refusal({ problems, problemCount }: WeatherRefused, fileName: string): ProblemException {
  const more =
    problemCount > problems.length
      ? ` The first ${String(problems.length)} of ${String(problemCount)} are listed.`
      : '';
  return new ProblemException(
    HttpStatus.UNPROCESSABLE_ENTITY,
    'The weather file cannot be taken',
    `"${fileName}" was not saved.${more}`,
    { kind: 'weather-refused', errors: problems.map((problem) => ({ ...problem })) },
  );
}
